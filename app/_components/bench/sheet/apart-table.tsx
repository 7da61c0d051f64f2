import type { ComparedMap, ComparedPart } from '@/lib/contracts/compare';
import { Ledger } from '../../ledger/ledger';
import { VerdictMark } from '../../marks/verdict-mark';
import { Formula } from '../../math/formula';
import { mapWord, placeTex } from '../map-words';
import { LongFormula } from './long-formula';

interface RowProps {
  readonly degree: number | undefined;
  readonly one: ComparedMap;
  readonly placed: boolean;
  readonly chosen: boolean;
}

function ApartRow({ degree, one, placed, chosen }: RowProps) {
  const mark = !one.same && <VerdictMark of="different" className="inl" label="Different here" />;
  return (
    <tr className={one.same ? (chosen ? 'chosen' : undefined) : 'apart'} data-same={one.same}>
      {degree !== undefined && <td className="st num">{String(degree).replace('-', '−')}</td>}
      {placed && (
        <td className="st">
          {one.place !== undefined && <Formula tex={placeTex(one.place)} />}
          {mark}
        </td>
      )}
      <td className="st">
        <LongFormula text={one.left.text} tex={one.left.tex} />
      </td>
      <td className="st">
        <LongFormula text={one.right.text} tex={one.right.tex} />
      </td>
      <td className="st">
        <Formula tex={one.target} />
      </td>
      <td className={one.same ? 'text quiet' : 'text'}>
        {mapWord[one.map]}
        {!placed && mark}
      </td>
    </tr>
  );
}

/** Everything that was compared, one row a homomorphism: where, both values, the group they lie in. */
export function ApartTable({
  parts,
  chosen,
}: {
  readonly parts: readonly ComparedPart[];
  readonly chosen: string | undefined;
}) {
  const several = parts.length > 1;
  const placed = parts.some((part) => part.compared.some((one) => one.place !== undefined));
  return (
    <Ledger
      head={[...(several ? ['degree'] : []), ...(placed ? ['at'] : []), 'left', 'right', 'compared in', 'by']}
      caption="Left and right apart"
    >
      {parts.flatMap((part) =>
        part.compared.map((one, index) => (
          <ApartRow
            key={`${part.degree}:${one.map}:${one.place ?? ''}:${index}`}
            degree={several ? part.degree : undefined}
            one={one}
            placed={placed}
            chosen={chosen === `${part.degree}:${one.place ?? `map:${one.map}`}`}
          />
        )),
      )}
    </Ledger>
  );
}
