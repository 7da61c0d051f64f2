import { type Mark, VerdictMark } from '../../_components/marks/verdict-mark';
import { Formula } from '../../_components/math/formula';
import { Row } from '../../_components/shell/row';

const marks: readonly { of: Mark; name: string; says: string }[] = [
  {
    of: 'equal',
    name: 'Equal',
    says: 'The two sides are the same class, in every degree that occurs. The theorem that says so is named.',
  },
  {
    of: 'different',
    name: 'Different',
    says: 'A homomorphism takes two values. The first one that does is named, with its place and both values: degree first, then place, then value.',
  },
  {
    of: 'undecided',
    name: 'Undecided',
    says: 'What was compared agrees, and what was compared does not see everything, and no proof was found. The table of fields says where this can occur; the sheet shows what was tried and what can be done.',
  },
  {
    of: 'unread',
    name: 'Unread',
    says: 'The line could not be read. The place and what could stand there are shown under it; the last answer stays on the sheet.',
  },
  {
    of: 'old',
    name: 'Old answer',
    says: 'The line has changed since. The tiles are hatched until the new answer is there.',
  },
];

const maps: readonly { name: string; says: string; tex?: string }[] = [
  { name: 'rank', says: 'the rank of a form, or the rank modulo 2 below degree 0' },
  { name: 'signature', says: 'the signature at the real place' },
  { name: 'residue', says: 'the residue at a place, against its default uniformizer', tex: '\\partial_p^{p}' },
  { name: 'specialisation', says: 'the value at a place of the part that does not ramify there', tex: 's_p^{p}' },
  { name: 'product', says: 'modulo η in degree 1: the product of the entries', tex: 'F^\\times' },
  { name: 'symbol', says: 'modulo η in degree 2: the norm residue symbol of a local field' },
  { name: 'discriminant', says: 'the determinant of a form, modulo squares', tex: 'F^\\times/F^{\\times 2}' },
  { name: 'hasse', says: 'the Hasse invariant, for forms of equal rank' },
  { name: 'class', says: 'the class itself, where the field has a closed form' },
  { name: 'word', says: 'the coefficients of the canonical word in independent letters' },
];

export function Verdicts() {
  return (
    <Row side="verdicts" id="verdicts" className="sec ruled">
      <ul className="meanings">
        {marks.map((mark) => (
          <li key={mark.of} id={`verdict-${mark.of}`}>
            <VerdictMark of={mark.of} />
            <p className="text">
              <b>{mark.name}.</b> {mark.says}
            </p>
          </li>
        ))}
      </ul>
      <p className="text mt-4 max-w-[44em]">
        Of a chain: different if one step is, else undecided if one is, else equal. The floor of tiles shows what was
        compared, degrees down and places across: a tile is <i>whole</i> where both sides have the value painted on it,{' '}
        <i>faint</i> where both are zero, <i>split</i> where they differ, with the left value above and the right one
        below.
      </p>
    </Row>
  );
}

export function Evidence() {
  return (
    <Row side="evidence" id="evidence" className="sec ruled">
      <div className="prose">
        <p>
          A verdict rests on homomorphisms that are applied to both sides; words are never expanded for it.{' '}
          <i>Left and right apart</i> lists every map, its place, both values and the group they lie in.
        </p>
        <dl className="terms">
          {maps.map((map) => (
            <div key={map.name} id={`map-${map.name}`}>
              <dt>{map.name}</dt>
              <dd>
                {map.says}
                {map.tex !== undefined && (
                  <>
                    , <Formula tex={map.tex} />
                  </>
                )}
              </dd>
            </div>
          ))}
        </dl>
        <h3 id="modulo">Modulo η and modulo h</h3>
        <p>
          <code>modEta</code> says whether the sides agree in Milnor K-theory,{' '}
          <Formula tex="\K_*/\eta = K^{\mathrm M}_*" />; <code>modH</code> whether they agree in{' '}
          <Formula tex="\K_*/h" />, whose part of degree <Formula tex="n" /> is <Formula tex="I^n(F)" /> inside the Witt
          ring. The sides are equal exactly when both hold. So of a different pair they say which half of it fails: in{' '}
          <Formula tex="[6] = [2] + [3]" /> only the second does.
        </p>
      </div>
    </Row>
  );
}
