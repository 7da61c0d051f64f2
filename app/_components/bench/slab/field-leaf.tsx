'use client';

import { useQuery } from '@tanstack/react-query';
import { type FormEvent, useEffect, useId, useMemo, useState } from 'react';
import type { FieldName } from '@/engine/expression/field-name';
import { readFieldName } from '@/grammar/read';
import { ReadingError } from '@/grammar/reading-error';
import { Button } from '../../button/button';
import { Leaf } from '../../leaf/leaf';
import { Formula } from '../../math/formula';
import { askField, Declined } from '../ask';
import { fieldFace } from '../field-face';
import { fieldMeaning, fieldWords, needsService } from '../field-meaning';
import { Said } from '../phrase';

/** Fields that are asked for most, in the order of the help page. */
const common = [
  'Q',
  'R',
  'C',
  'Q_2',
  'Q_5',
  'F_2',
  'F_7',
  'F_9',
  'F_3[w]/(w^2+1)',
  'F_7(t)',
  'Q(t)',
  'Q[w]/(w^2-5)',
  'any',
];

type ReadName = { readonly name: FieldName } | { readonly error: string } | undefined;

function read(text: string): ReadName {
  if (text.trim() === '') return undefined;
  try {
    return { name: readFieldName(text) };
  } catch (error) {
    if (error instanceof ReadingError) return { error: error.message };
    throw error;
  }
}

/** What a name means, checked with the service where the name alone does not tell. */
function useFieldCheck(text: string, wanted: boolean) {
  const [rested, setRested] = useState(text);
  useEffect(() => {
    const timer = setTimeout(() => setRested(text), 250);
    return () => clearTimeout(timer);
  }, [text]);
  const name = useMemo(() => read(text), [text]);
  const asks = name !== undefined && 'name' in name && needsService(name.name);
  const { data, error } = useQuery({
    queryKey: ['field', text.trim()],
    queryFn: ({ signal }) => askField(text.trim(), signal),
    enabled: wanted && asks && rested === text,
    retry: false,
    staleTime: Infinity,
    refetchOnWindowFocus: false,
  });
  if (!name) return { error: undefined, phrase: undefined, waits: false };
  if ('error' in name) return { error: name.error, phrase: undefined, waits: false };
  const refused = error instanceof Declined && error.problem?.status === 422 ? error.message : undefined;
  return { error: refused, phrase: fieldMeaning(name.name, data?.field), waits: asks && !data && !error };
}

interface Props {
  readonly open: boolean;
  readonly field: string;
  readonly onClose: () => void;
  readonly onChoose: (field: string) => void;
}

function Form({ field, onClose, onChoose }: Omit<Props, 'open'>) {
  const [text, setText] = useState(field);
  const input = useId();
  const { error, phrase, waits } = useFieldCheck(text, true);
  const take = (event: FormEvent) => {
    event.preventDefault();
    if (error === undefined && text.trim() !== '') onChoose(text.trim());
  };
  return (
    <form onSubmit={take} noValidate>
      <label className="label" htmlFor={input}>
        Name of the field
      </label>
      <input
        id={input}
        className="field mono"
        value={text}
        onChange={(event) => setText(event.target.value)}
        onFocus={(event) => event.target.select()}
        aria-invalid={error !== undefined}
        aria-describedby={`${input}-hint`}
        autoComplete="off"
        autoCapitalize="off"
        spellCheck={false}
      />
      <p className={error === undefined ? 'hint' : 'hint hint-wrong'} id={`${input}-hint`} role="status">
        {error ?? (phrase ? <Said phrase={phrase} /> : 'For instance Q, F_9, Q_5, F_3[w]/(w^2+1), any.')}
        {error === undefined && waits ? ' …' : ''}
      </p>
      <ul className="field-list" aria-label="Common fields">
        {common.map((name) => {
          const face = fieldFace(name);
          const known = read(name);
          return (
            <li key={name}>
              <button type="button" aria-pressed={name === text.trim()} onClick={() => onChoose(name)}>
                <span className="field-list-name">
                  {face.tex === undefined ? <i>{face.word}</i> : <Formula tex={face.tex} />}
                </span>
                <span className="quiet">{known && 'name' in known && <Said phrase={fieldWords(known.name)} />}</span>
              </button>
            </li>
          );
        })}
      </ul>
      <div className="btns">
        <Button
          type="submit"
          kind="primary"
          unavailable={error === undefined ? undefined : 'There is no such field to take'}
        >
          Take this field
        </Button>
        <Button onClick={onClose}>Leave it</Button>
      </div>
    </form>
  );
}

/** The leaf in which a field is named or chosen; it says what the name means, or why it names no field. */
export function FieldLeaf({ open, field, onClose, onChoose }: Props) {
  return (
    <Leaf open={open} onClose={onClose} title="Over which field?">
      <Form field={field} onClose={onClose} onChoose={onChoose} />
    </Leaf>
  );
}
