import { Ledger } from '../../_components/ledger/ledger';
import { Formula } from '../../_components/math/formula';
import { Row } from '../../_components/shell/row';

const relations = [
  { id: 'steinberg', name: 'Steinberg', tex: '[a][1-a] = 0', when: 'a \\ne 0, 1' },
  { id: 'product-rule', name: 'product rule', tex: '[ab] = [a] + [b] + \\eta[a][b]', when: '' },
  { id: 'eta-commutation', name: 'η commutes', tex: '\\eta[a] = [a]\\eta', when: '' },
  { id: 'eta-h', name: 'η kills h', tex: '\\eta h = 0', when: 'h = 2 + \\eta[-1]' },
];

const consequences = [
  '[1] = 0, \\qquad \\q{1} = 1',
  '\\q{ab} = \\q{a}\\q{b}, \\qquad \\q{ab^2} = \\q{a}',
  '[ab] = [a] + \\q{a}[b], \\qquad [a^{-1}] = -\\q{a}[a]',
  '[a][-a] = 0, \\qquad [a][a] = [a][-1]',
  '[a][b] = \\e\\,[b][a], \\qquad \\eta[a][b] = \\eta[b][a]',
  '[a^n] = n_\\e[a], \\qquad [a^2] = h[a]',
  'h[-1] = 0, \\qquad \\e\\eta = \\eta, \\qquad \\q{a}h = h',
  '\\q{a} + \\q{-a} = h',
  '\\q{a} + \\q{b} = \\q{a+b} + \\q{ab(a+b)}, \\qquad a + b \\ne 0',
];

const degrees = [
  {
    degree: 'n < 0',
    group: 'W(F)',
    says: (
      <>
        the Witt ring; <Formula tex="\q{a}" /> stands for <Formula tex="\eta^{-n}\q{a}" />
      </>
    ),
  },
  { degree: 'n = 0', group: '\\GW(F)', says: <>the Grothendieck–Witt ring of symmetric bilinear forms</> },
  {
    degree: 'n > 0',
    group: 'K_n^{\\mathrm M}(F) \\times_{I^n/I^{n+1}} I^n(F)',
    says: (
      <>pairs of a class of Milnor K-theory and one of a power of the fundamental ideal, which agree where they meet</>
    ),
  },
];

/** The ring: four relations, what follows from them, what lies in which degree. */
export function Relations() {
  return (
    <Row side="relations" id="relations" className="sec ruled">
      <div className="prose">
        <p>
          <Formula tex="\K_*(F)" /> is the graded ring with generators <Formula tex="[a]" />, one for each unit{' '}
          <Formula tex="a" /> of <Formula tex="F" />, in degree 1, and <Formula tex="\eta" /> in degree −1, and four
          relations (Morel,{' '}
          <i>
            <Formula tex="\mathbb{A}^1" />
            -Algebraic Topology over a Field
          </i>
          , ch. 3):
        </p>
        <Ledger caption="The four relations" head={['relation', 'it says', 'where']}>
          {relations.map((relation) => (
            <tr key={relation.id} id={`relation-${relation.id}`}>
              <td className="text">{relation.name}</td>
              <td className="st">
                <Formula tex={relation.tex} />
              </td>
              <td className="text quiet">{relation.when !== '' && <Formula tex={relation.when} />}</td>
            </tr>
          ))}
        </Ledger>
        <p>From them follow, over every field:</p>
        <ul className="ways">
          {consequences.map((tex) => (
            <li key={tex}>
              <Formula tex={tex} />
            </li>
          ))}
        </ul>
        <h3 id="degrees">What lies in which degree</h3>
        <Ledger caption="The groups by degree" head={['degree', 'group', 'which is']}>
          {degrees.map((row) => (
            <tr key={row.degree}>
              <td className="st whitespace-nowrap">
                <Formula tex={row.degree} />
              </td>
              <td className="st">
                <Formula tex={row.group} />
              </td>
              <td className="text quiet">{row.says}</td>
            </tr>
          ))}
        </Ledger>
        <p>
          For <Formula tex="n \ge 2" /> and <Formula tex="r \ge 1" /> the group <Formula tex="\K_{r-j}(F)" /> is that of
          pointed <Formula tex="\mathbb{A}^1" />
          -homotopy classes of maps{' '}
          <Formula tex="S^n \wedge \mathbb{G}_m^{\wedge j} \to S^n \wedge \mathbb{G}_m^{\wedge r}" /> (Morel, ch. 6). A
          class of degree 0 is such a degree: its rank is the degree over the complex numbers, its signature the degree
          over the real ones.
        </p>
      </div>
    </Row>
  );
}
