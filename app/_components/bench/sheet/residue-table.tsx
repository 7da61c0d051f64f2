import type { ResiduesAnswer } from '@/lib/contracts/residues';
import { Ledger } from '../../ledger/ledger';
import { Formula } from '../../math/formula';
import { placeTex } from '../map-words';
import { LongFormula } from './long-formula';

interface Props {
  readonly answer: ResiduesAnswer;
  /** The places were named: nothing is said of the others. */
  readonly only?: boolean;
}

/** Where the class ramifies: residue and specialisation at each such place, against the uniformizer that is named. */
export function ResidueTable({ answer, only = false }: Props) {
  const elsewhere = !only && answer.unramifiedElsewhere ? 'At every place not listed the residue is zero.' : '';
  if (answer.residues.length === 0)
    return <p className="lead">The class is unramified: its residue is zero at every place.</p>;
  return (
    <div>
      <Ledger head={['place', 'residue field', 'uniformizer', 'residue', 'specialisation']} caption="Residues">
        {answer.residues.map((residue) => (
          <tr key={residue.place}>
            <td className="st">
              <Formula tex={placeTex(residue.place)} />
            </td>
            <td className="st">
              <Formula tex={residue.residueFieldTex} />
            </td>
            <td className="st">
              <Formula tex={residue.uniformizerTex} />
            </td>
            <td className="st">
              <LongFormula text={residue.value.text} tex={residue.value.tex} />
            </td>
            <td className="st">
              <LongFormula text={residue.specialisation.text} tex={residue.specialisation.tex} />
            </td>
          </tr>
        ))}
      </Ledger>
      {elsewhere && <p className="hint">{elsewhere}</p>}
    </div>
  );
}
