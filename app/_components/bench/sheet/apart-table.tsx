import type { ComparedMap, ComparedPart } from '@/lib/contracts/compare';
import { Ledger } from '../../ledger/ledger';
import { VerdictMark } from '../../marks/verdict-mark';
import { Formula } from '../../math/formula';
import { mapWord, placeTex } from '../map-words';
import { LongFormula } from './long-formula';

function ApartRow({ degree, one, chosen }: { degree: number | undefined; one: ComparedMap; chosen: boolean }) {
  return (
    <tr className={one.same ? (chosen ? 'chosen' : undefined) : 'apart'} data-same={one.same}>
      {degree !== undefined && <td className="st num">{String(degree).replace('-', '−')}</td>}
      <td className="st">
        {one.place === undefined ? <span className="quiet">everywhere</span> : <Formula tex={placeTex(one.place)} />}
        {!one.same && <VerdictMark of="different" className="inl" label="Different here" />}
      </td>
      <td className="st">
        <LongFormula text={one.left.text} tex={one.left.tex} />
      </td>
      <td className="st">
        <LongFormula text={one.right.text} tex={one.right.tex} />
      </td>
      <td className="st">
        <Formula tex={one.target} />
      </td>
      <td className={one.same ? 'text quiet' : 'text'}>{mapWord[one.map]}</td>
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
  return (
    <Ledger
      head={[...(several ? ['degree'] : []), 'at', 'left', 'right', 'compared in', 'by']}
      caption="Left and right apart"
    >
      {parts.flatMap((part) =>
        part.compared.map((one, index) => (
          <ApartRow
            key={`${part.degree}:${one.map}:${one.place ?? ''}:${index}`}
            degree={several ? part.degree : undefined}
            one={one}
            chosen={chosen === `${part.degree}:${one.place ?? `map:${one.map}`}`}
          />
        )),
      )}
    </Ledger>
  );
}
