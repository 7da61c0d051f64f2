import { Formula } from '../../_components/math/formula';
import { Row } from '../../_components/shell/row';

export function Cautions() {
  return (
    <Row side="cautions" id="cautions" className="sec ruled">
      <ul className="ways">
        <li>A verdict is a computation under stated hypotheses. It does not replace refereeing.</li>
        <li>
          Read the side conditions. Over <code>any</code> the statement is claimed for all values at which every entry
          is a unit, and for no others.
        </li>
        <li>
          An equality over <Formula tex="F" /> holds over every extension of <Formula tex="F" />. A difference may
          vanish there: over <Formula tex="\C" /> many things agree that differ over <Formula tex="\Q" />.
        </li>
        <li>A residue belongs to the uniformizer it was taken against. Quote it together with that.</li>
        <li>
          Over <Formula tex="\R" />, <Formula tex="\C" /> and <Formula tex="\Q_p" /> entries are rational numbers. What
          is said there is said about such words.
        </li>
        <li>
          Every answer names the version of the engine. Canonical texts of two versions need not look alike; their
          classes can be compared.
        </li>
      </ul>
    </Row>
  );
}
