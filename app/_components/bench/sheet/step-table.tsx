'use client';

import { useState } from 'react';
import type { DerivationStep } from '@/lib/contracts/normalize';
import { Button } from '../../button/button';
import { Said, withFormulas } from '../phrase';
import { LongFormula } from './long-formula';

/** So many steps are shown before the rest is asked for. */
const shownAtFirst = 8;

/** "powers: [aⁿ] = n_ε[a]" is a name and a formula; what it was used at follows. */
function Reason({ step }: { readonly step: DerivationStep }) {
  const [name = '', ...formula] = step.relation.split(': ');
  return (
    <>
      <Said phrase={withFormulas(name)} />
      {formula.length > 0 && (
        <span className="upright">
          {' '}
          <Said phrase={withFormulas(formula.join(': '))} />
        </span>
      )}
      {step.args.length > 0 && (
        <>
          , at <span className="num upright">{step.args.join(', ')}</span>
        </>
      )}
    </>
  );
}

/** The derivation of the canonical word: each line follows from the one above by the relation beside it. */
export function StepTable({ steps }: { readonly steps: readonly DerivationStep[] }) {
  const [all, setAll] = useState(false);
  const first = steps[0];
  if (!first) return <p className="text quiet">It is a canonical word as it stands: no relation is needed.</p>;
  const shown = all ? steps : steps.slice(0, shownAtFirst);
  const long = steps.some((step) => Math.max(step.before.text.length, step.after.text.length) > 44);
  const more = steps.length - shown.length;
  return (
    <div>
      <table className={`chain chain-steps ${long ? 'long' : ''}`}>
        <caption className="sr">Derivation, one relation a line</caption>
        <tbody>
          <tr>
            <td className="eq">
              <LongFormula text={first.before.text} tex={first.before.tex} />
            </td>
            <td className="why">as it stands</td>
          </tr>
          {shown.map((step, index) => (
            <tr key={index}>
              <td className="eq rel">
                <LongFormula text={`= ${step.after.text}`} tex={`{} = ${step.after.tex}`} />
              </td>
              <td className="why">
                <Reason step={step} />
              </td>
            </tr>
          ))}
        </tbody>
      </table>
      {more > 0 && (
        <Button kind="plain" onClick={() => setAll(true)}>
          Show {more} more {more === 1 ? 'step' : 'steps'}
        </Button>
      )}
    </div>
  );
}
