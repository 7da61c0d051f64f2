import type { ReactNode } from 'react';
import type { ComparedPart } from '@/lib/contracts/compare';
import { Floor, type FloorCell } from '../../tile/floor';
import { floorOfComparison } from '../../tile/floor-of-parts';
import { withRankAtReal } from '../real-place';
import { LongFormula } from './long-formula';

function FormsOf({ part }: { readonly part: ComparedPart }): ReactNode {
  const { forms } = part;
  if (!forms) return <span className="small quiet">past the budget of an answer while one types</span>;
  if (part.verdict === 'equal' || forms.left.text === forms.right.text)
    return <LongFormula text={forms.left.text} tex={forms.left.tex} />;
  return (
    <span className="sides">
      <i>left</i>
      <LongFormula text={forms.left.text} tex={forms.left.tex} />
      <i>right</i>
      <LongFormula text={forms.right.text} tex={forms.right.tex} />
    </span>
  );
}

interface Props {
  readonly parts: readonly ComparedPart[];
  readonly onShow: (cell: FloorCell | undefined) => void;
  readonly children?: ReactNode;
}

/** The floor of tiles of a comparison, the canonical forms at the ends of its rows, and what its tiles mean. */
export function EvidenceFloor({ parts, onShow, children }: Props) {
  const { places, rows } = floorOfComparison(withRankAtReal(parts));
  const states = new Set(rows.flatMap((row) => row.cells.map((cell) => cell?.state)));
  const agree = parts.every((part) => part.verdict === 'equal');
  return (
    <div>
      <Floor
        label="Values by degree and place"
        places={places}
        rows={rows.map((row, index) => {
          const part = parts[index];
          return { ...row, of: part && <FormsOf part={part} /> };
        })}
        heading={agree ? 'canonical form of both sides' : 'canonical forms'}
        onShow={onShow}
      />
      <p className="legend">
        {states.has('split') && <span>Split: left value above the diagonal, right value below.</span>}
        {states.has('whole') && <span>Whole: both sides have this value.</span>}
        {states.has('agree') && <span>Faint: nothing on either side.</span>}
        {states.has('bare') && <span>Dashed: not compared.</span>}
        {children}
      </p>
    </div>
  );
}
