'use client';

import { useId, useState } from 'react';
import { useKey } from '../../keys/keys-provider';
import { Formula } from '../../math/formula';
import { fieldFace } from '../field-face';
import { FieldLeaf } from './field-leaf';

interface Props {
  readonly field: string;
  readonly onChange: (field: string) => void;
  /** What the service says against the field that is named now. */
  readonly refusal?: string;
}

/** The field a question is asked over. The button opens a leaf in which any field can be named. */
export function FieldPicker({ field, onChange, refusal }: Props) {
  const [open, setOpen] = useState(false);
  const id = useId();
  const face = fieldFace(field);
  useKey({ keyName: 'F', label: 'choose the field', act: () => setOpen(true) });
  return (
    <div className="bench-over">
      <span className="label" id={`${id}-label`}>
        Over the field
      </span>
      <button
        type="button"
        className="pick over"
        id={id}
        aria-haspopup="dialog"
        aria-labelledby={`${id}-label ${id}`}
        aria-describedby={refusal === undefined ? undefined : `${id}-refusal`}
        title="Choose a field (F)"
        onClick={() => setOpen(true)}
      >
        {face.tex === undefined ? (
          <span className="it">{face.word}</span>
        ) : (
          <Formula tex={face.tex} className="pick-name" />
        )}
      </button>
      {refusal !== undefined && (
        <p className="hint hint-field" id={`${id}-refusal`}>
          {refusal}
        </p>
      )}
      <FieldLeaf
        open={open}
        field={field}
        onClose={() => setOpen(false)}
        onChoose={(next) => {
          onChange(next);
          setOpen(false);
        }}
      />
    </div>
  );
}
