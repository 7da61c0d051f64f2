'use client';

import { useId } from 'react';
import { useKey, useKeyNote } from '../../keys/keys-provider';
import { LineEditor } from '../editor/line-editor';
import type { BenchState } from '../use-bench';
import { FaultNote } from './fault-note';
import { FieldPicker } from './field-picker';
import { InsertKeys } from './insert-keys';
import { StatusLine } from './status-line';

interface Props {
  readonly bench: BenchState;
  readonly label: string;
  /** Without insertion keys and status: the line of the first page. */
  readonly bare?: boolean;
}

/** What is asked: the field and the written line, with what is wrong in it right under it. */
export function SlabRow({ bench, label, bare = false }: Props) {
  const { line, field, setField, text, change, reading, asked, fault, noted } = bench;
  const id = useId();
  const labelId = `${id}-label`;
  const statusId = `${id}-status`;
  const faultId = `${id}-fault`;
  useKey({ keyName: 'I', label: 'back to the line', act: () => line.current?.focus() });
  useKey({ keyName: 'S', label: 'stop long work', act: asked.stop, enabled: asked.slow });
  useKeyNote({ keys: ['Ctrl', 'Enter'], label: 'in the line: decide now' });
  useKeyNote({ keys: ['Alt', '['], label: 'in the line: [ ] round what is chosen' });
  useKeyNote({ keys: ['Alt', '<'], label: 'in the line: ⟨ ⟩ round what is chosen' });
  useKeyNote({ keys: ['Esc'], label: 'leave the line, so that letters act' });
  const lineFault = fault?.ofField ? undefined : fault;
  return (
    <div className="row">
      <FieldPicker field={field} onChange={setField} refusal={fault?.ofField && noted ? fault.message : undefined} />
      <div className="bench-asked">
        <span className="label" id={labelId} onClick={() => line.current?.focus()}>
          {label}
        </span>
        <LineEditor
          ref={line}
          initial={text}
          onChange={change}
          onDecide={asked.askNow}
          fault={lineFault?.spans}
          labelledBy={labelId}
          describedBy={`${faultId} ${statusId}`}
        />
        {lineFault && noted && (
          <FaultNote
            id={faultId}
            fault={lineFault}
            onInsert={(offset, piece) => line.current?.insertAt(offset, piece)}
          />
        )}
        {!bare && (
          <div className="under">
            <InsertKeys onInsert={(piece) => line.current?.insert(piece)} />
            <StatusLine id={statusId} reading={reading} fault={fault} asked={asked} />
          </div>
        )}
      </div>
    </div>
  );
}
