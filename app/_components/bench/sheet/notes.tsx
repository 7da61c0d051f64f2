'use client';

import type { Answer } from '../ask';
import { degreeMeaning, degreeName } from '../degrees';
import { Formula } from '../../math/formula';
import { KeepButton, useKeep } from '../keeping';
import { type Phrase, Said, tex, withFormulas } from '../phrase';

function conditionsPhrase(answer: Answer): Phrase {
  const { field } = answer.body;
  if (field.text === 'any') return ['None but that every entry is a unit.'];
  if (/^(Q|R|C)(_|$)/.test(field.text)) return ['None. Every entry is a fixed non-zero rational.'];
  return ['None. Every entry is a fixed unit of ', tex(field.tex), '.'];
}

function SideConditions({ answer }: { readonly answer: Answer }) {
  const conditions = answer.body.sideConditions;
  return (
    <div>
      <h2>side conditions</h2>
      {conditions.length === 0 && (
        <p>
          <Said phrase={conditionsPhrase(answer)} />
        </p>
      )}
      {conditions.map((condition) => (
        <p key={condition.text}>
          <Formula tex={condition.tex} />
        </p>
      ))}
    </div>
  );
}

function Degrees({ answer }: { readonly answer: Answer }) {
  const { parts } = answer.body;
  if (parts.length === 0) return null;
  return (
    <div>
      <h2>where it lies</h2>
      <ul>
        {parts.slice(0, 6).map((part) => (
          <li key={part.degree}>
            {degreeName(part.degree)}: <Formula tex={part.group.tex} />, {degreeMeaning(part.degree)}
          </li>
        ))}
      </ul>
    </div>
  );
}

/** A pair that differs can be kept too, and then says so. */
function KeepWarning({ answer, current }: { readonly answer: Answer; readonly current: boolean }) {
  const keep = useKeep(answer.question);
  if (!keep || answer.kind !== 'statement' || answer.body.verdict !== 'different') return null;
  return (
    <div>
      <h2>keep it all the same?</h2>
      <p>
        A different pair can be kept as a warning. The register then says that the two sides are <i>not</i> the same,
        with this evidence. <KeepButton question={answer.question} verdict="different" current={current} />
      </p>
    </div>
  );
}

function KeepResidue({ answer, current }: { readonly answer: Answer; readonly current: boolean }) {
  const keep = useKeep(answer.question, 'residue');
  if (!keep || answer.kind !== 'expression' || !current) return null;
  return (
    <div>
      <h2>keep a residue</h2>
      <p>
        What the residue of this class is at a place can be{' '}
        <button type="button" className="plain" onClick={keep}>
          kept in the register
        </button>
        .
      </p>
    </div>
  );
}

interface Props {
  readonly answer: Answer;
  /** Whether it answers what stands in the line now. */
  readonly current: boolean;
  readonly meaning: Phrase | undefined;
  /** Puts another text into the line. */
  readonly onWrite: (text: string) => void;
}

/** The notes at the edge of the sheet: what the answer rests on, where the parts lie, where one can go from here. */
export function Notes({ answer, current, meaning, onWrite }: Props) {
  const statement = answer.kind === 'statement' ? answer.body : undefined;
  const left = statement?.sides[0];
  const right = statement?.sides.at(-1);
  return (
    <aside className="notes" aria-label={statement ? 'With this statement' : 'With this expression'}>
      <SideConditions answer={answer} />
      <KeepWarning answer={answer} current={current} />
      {statement && statement.evidence.theorem !== '' && (
        <div>
          <h2>{statement.verdict === 'undecided' ? 'how far it was looked' : 'why this is enough'}</h2>
          <p>
            <Said phrase={withFormulas(statement.evidence.theorem)} />
          </p>
        </div>
      )}
      <Degrees answer={answer} />
      {meaning && (
        <div>
          <h2>the field</h2>
          <p>
            <Formula tex={answer.body.field.tex} />, <Said phrase={meaning} />.
          </p>
        </div>
      )}
      {left && right && (
        <div>
          <h2>go on with</h2>
          <p>
            the{' '}
            <button type="button" className="plain" onClick={() => onWrite(left.text)}>
              left side
            </button>{' '}
            or the{' '}
            <button type="button" className="plain" onClick={() => onWrite(right.text)}>
              right side
            </button>{' '}
            by itself: its canonical form, derivation and residues
          </p>
        </div>
      )}
      <KeepResidue answer={answer} current={current} />
    </aside>
  );
}
