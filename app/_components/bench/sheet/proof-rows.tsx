import type { EvidenceAnswer, TriedAnswer } from '@/lib/contracts/compare';
import { Ledger } from '../../ledger/ledger';
import { Formula } from '../../math/formula';
import { Row } from '../../shell/row';
import { LongFormula } from './long-formula';

type Relations = NonNullable<EvidenceAnswer['relations']>;

/** An equality over every field: the Steinberg relations whose multiples add up to left minus right. */
export function RelationRows({ relations }: { readonly relations: Relations }) {
  return (
    <Row side="by relations" sideClass="to-table" id="relations">
      <Ledger caption="Relations that add up to left minus right" head={['times', 'relation', 'since']} narrow="scroll">
        {relations.map(({ times, left, right }, index) => (
          <tr key={index}>
            <td className="st">
              <LongFormula text={times.text} tex={times.tex} />
            </td>
            <td className="st">
              <Formula tex={`[${left.tex}][${right.tex}] = 0`} />
            </td>
            <td className="st quiet">
              <Formula tex={`${left.tex}+${right.tex} = 1`} />
            </td>
          </tr>
        ))}
      </Ledger>
      <p className="legend">
        <span>In canonical words, left minus right is the sum of these lines.</span>
      </p>
    </Row>
  );
}

const counted = (count: number, one: string, many: string): string => `${count} ${count === 1 ? one : many}`;

/** What was at hand for a proof, and how far that went. */
function Sought({ proof }: { readonly proof: NonNullable<TriedAnswer['proof']> }) {
  const { generators, pairs, relations, limit } = proof;
  return (
    <Row side="proof sought" sideClass="to-lead" id="sought">
      <p className="lead">
        Units at hand:{' '}
        {generators.map((unit, index) => (
          <span key={unit.text}>
            {index > 0 && ', '}
            <Formula tex={unit.tex} />
          </span>
        ))}
        .
      </p>
      <p className="text quiet mt-1">
        {pairs === 0
          ? 'No two of their products add up to 1 as far as was looked, so no Steinberg relation among them is at hand.'
          : `${counted(pairs, 'pair', 'pairs')} of their products ${pairs === 1 ? 'adds' : 'add'} up to 1; ` +
            `${counted(relations, 'multiple', 'multiples')} of these Steinberg relations do not combine to left minus right.`}
        {limit.reached && ' The search ended at its limit.'}
      </p>
    </Row>
  );
}

/** An open question: what was sought, and how one can go on. */
export function OpenRows({ tried }: { readonly tried: TriedAnswer }) {
  return (
    <>
      {tried.proof && <Sought proof={tried.proof} />}
      <Row side="what can be done" sideClass="to-lead" id="open">
        <ul className="ways">
          <li>Bring in a further unit by a step of its own: a chain with a word that makes a pair adding up to 1.</li>
          <li>Name a field, or a hypothesis after a semicolon, if the statement is needed there only.</li>
          <li>Keep it as a draft. It can be checked again whenever the engine changes.</li>
        </ul>
      </Row>
    </>
  );
}
