import { Formula } from '../../_components/math/formula';
import { Row } from '../../_components/shell/row';

/** What differs from book to book, and how it is here. */
export function Conventions() {
  return (
    <Row side="conventions" id="conventions" className="sec ruled">
      <div className="prose">
        <dl className="terms">
          <div id="convention-pfister">
            <dt>Pfister sign</dt>
            <dd>
              <Formula tex="\pf{a} = 1 - \q{a} = -\eta[a]" />, as in Elman, Karpenko and Merkurjev. In the Witt ring it
              is the class of the form <Formula tex="\q{1, -a}" />. Lam writes <Formula tex="\pf{a}" /> for{' '}
              <Formula tex="\q{1, a}" />: change the sign of the entry when you copy from there.
            </dd>
          </div>
          <div id="convention-uniformizer">
            <dt>Uniformizer</dt>
            <dd>
              A residue is taken against a named uniformizer <Formula tex="\pi" />; at a prime <Formula tex="p" /> it is{' '}
              <Formula tex="p" /> unless you name another. With <Formula tex="u" /> a unit there,{' '}
              <Formula tex="\partial^{u\pi} = \q{\bar u}\,\partial^{\pi}" />, and the specialisation changes by{' '}
              <Formula tex="s^{u\pi}(\alpha) = s^{\pi}(\alpha) + [\bar u^{-1}]\,\partial^{\pi}(\alpha)" />. Whether a
              residue is zero does not depend on the choice.
            </dd>
          </div>
          <div id="convention-residue">
            <dt>Side of the uniformizer</dt>
            <dd>
              The uniformizer stands on the left:{' '}
              <Formula tex="\partial([\pi][u_2]\cdots[u_n]) = [\bar u_2]\cdots[\bar u_n]" />. A unit passes it with{' '}
              <Formula tex="\partial([u]\alpha) = \e\,[\bar u]\,\partial(\alpha)" />.
            </dd>
          </div>
          <div id="convention-tame">
            <dt>Tame symbol</dt>
            <dd>
              Modulo <Formula tex="\eta" /> the residue of <Formula tex="[a][b]" /> at <Formula tex="p" /> is{' '}
              <Formula tex="(-1)^{\alpha\beta}\, b^{\alpha}/a^{\beta}" /> in <Formula tex="\F_p^\times" />, with{' '}
              <Formula tex="\alpha, \beta" /> the valuations of <Formula tex="a, b" />. It is the inverse of the tame
              symbol in Milnor’s book.
            </dd>
          </div>
          <div id="convention-hasse">
            <dt>Hasse invariant</dt>
            <dd>
              <Formula tex="s(\q{a_1, \dots, a_n}) = \prod_{i<j}(a_i, a_j)" />, over <Formula tex="i < j" />. It depends
              on rank and discriminant when hyperbolic planes are added, so forms are brought to the same rank first.
            </dd>
          </div>
          <div id="convention-places">
            <dt>Order of places and degrees</dt>
            <dd>
              The real place first, written <Formula tex="\infty" /> on a floor of tiles and <code>real</code> in
              answers; then the primes, rising. Degrees fall from the highest. A prime is in sight when it divides an
              entry.
            </dd>
          </div>
          <div id="convention-canonical">
            <dt>Canonical form</dt>
            <dd>
              Over <Formula tex="\Q" /> it is <Formula tex="b + \sum_p [p]\,\tilde r_p" />: from the largest prime in
              sight downwards the residue <Formula tex="r_p" /> is lifted to <Formula tex="\tilde r_p" /> with integers
              from 1 to <Formula tex="p-1" />, and what is left at the end is <Formula tex="b" />, a word in{' '}
              <Formula tex="\eta" /> and <Formula tex="[-1]" />. Where a non-square has to be chosen, it is the least
              one. Where a form is called canonical, two elements of the field are equal if and only if their texts are.
            </dd>
          </div>
        </dl>
      </div>
    </Row>
  );
}
