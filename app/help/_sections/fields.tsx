import type { ReactNode } from 'react';
import { Ledger } from '../../_components/ledger/ledger';
import { Formula } from '../../_components/math/formula';
import { Row } from '../../_components/shell/row';
import { Try } from './try';

interface FieldRow {
  readonly name: ReactNode;
  readonly write: readonly string[];
  readonly compared: ReactNode;
  readonly why: ReactNode;
  readonly example: { field: string; statement: string };
}

const rows: readonly FieldRow[] = [
  {
    name: <Formula tex="\Q" />,
    write: ['Q'],
    compared: (
      <>
        Every degree. The part at the real place (in degree 0 rank and signature, else the signature), and the residue
        at every prime in sight, 2 included.
      </>
    ),
    why: (
      <>
        The sequence <Formula tex="0 \to B_n \to \K_n(\Q) \to \bigoplus_p \K_{n-1}(\F_p) \to 0" /> is exact and split;{' '}
        <Formula tex="B_n" /> is spanned by words in <Formula tex="\eta" /> and <Formula tex="[-1]" />. Tate’s
        computation of <Formula tex="K_2(\Q)" /> (Milnor, <i>Introduction to Algebraic K-Theory</i>, §11), the Witt ring
        of <Formula tex="\Q" /> (Milnor and Husemoller, <i>Symmetric Bilinear Forms</i>, IV.2), and the pull-back
        theorem. Compare Kolderup, arXiv:1906.07506.
      </>
    ),
    example: { field: 'Q', statement: '[5][6] = [-1][6]' },
  },
  {
    name: <Formula tex="\F_q" />,
    write: ['F_7', 'F_9', 'F_3[z]/(z^2+1)', 'F_9[y]/(y^2+z+1)'],
    compared: (
      <>
        Every degree, in closed form. <Formula tex="q" /> odd: rank and discriminant in degree 0, the Witt ring of order
        4 below, <Formula tex="\F_q^\times" /> in degree 1, nothing above. <Formula tex="q" /> even: the rank, the rank
        modulo 2, <Formula tex="\F_q^\times" />, nothing above.
      </>
    ),
    why: (
      <>
        <Formula tex="K_2(\F_q) = 0" /> and <Formula tex="I^2(\F_q) = 0" /> (Milnor, Invent. Math. 9, 1970; Lam,{' '}
        <i>Introduction to Quadratic Forms over Fields</i>, II.3), and the pull-back theorem.
      </>
    ),
    example: { field: 'F_9', statement: '[z][z+1] = 0' },
  },
  {
    name: <Formula tex="\R" />,
    write: ['R'],
    compared: <>Every degree, for rational entries: rank, signature, and in degree 1 the product of the entries.</>,
    why: (
      <>
        Sylvester’s law, and <Formula tex="K_n^{\mathrm M}(\R)" /> is <Formula tex="\Z/2" /> with a uniquely divisible
        group for <Formula tex="n \ge 2" /> (Milnor 1970), where words with rational entries have no part in the
        divisible group.
      </>
    ),
    example: { field: 'R', statement: '<2> + <-3> = h' },
  },
  {
    name: <Formula tex="\C" />,
    write: ['C'],
    compared: (
      <>
        Every degree, for rational entries: the rank, the rank modulo 2 below degree 0, and in degree 1 the product of
        the entries.
      </>
    ),
    why: (
      <>
        Every form is a sum of <Formula tex="\q{1}" />, and <Formula tex="K_n^{\mathrm M}(\C)" /> is uniquely divisible
        for <Formula tex="n \ge 2" />, so that words with rational entries vanish there.
      </>
    ),
    example: { field: 'C', statement: '<-7> = 1' },
  },
  {
    name: <Formula tex="\Q_p" />,
    write: ['Q_2', 'Q_5'],
    compared: (
      <>
        Every degree, for rational entries: rank, discriminant and Hasse invariant; in degree 1 the product of the
        entries; in degree 2 the norm residue symbol.
      </>
    ),
    why: (
      <>
        Classification of forms over <Formula tex="\Q_p" /> (Serre, <i>A Course in Arithmetic</i>, III and IV; Lam VI),
        Moore’s theorem on <Formula tex="K_2" /> of a local field, and the pull-back theorem.
      </>
    ),
    example: { field: 'Q_5', statement: '[5][2] = [5][7]' },
  },
  {
    name: <Formula tex="\F_q(t)" />,
    write: ['F_7(t)', 'F_9(t)'],
    compared: (
      <>
        Every degree: the specialisation at infinity and the residue at every monic irreducible polynomial that divides
        an entry. Canonical forms are promised in every degree.
      </>
    ),
    why: (
      <>
        The sequence <Formula tex="0 \to \K_n(k) \to \K_n(k(t)) \to \bigoplus_P \K_{n-1}(k[t]/P) \to 0" /> is exact and
        split (Milnor, Invent. Math. 9, 1970, Theorem 2.3; Morel, ch. 3), and the residue fields are finite.
      </>
    ),
    example: { field: 'F_7(t)', statement: '[t][1-t] = 0' },
  },
  {
    name: <Formula tex="\Q(t)" />,
    write: ['Q(t)'],
    compared: (
      <>
        Every degree by the same sequence. In degree 3 a residue at a place of degree 2 or more lies in{' '}
        <Formula tex="K_2" /> of a number field: where symbols do not separate and no proof is found, the verdict is
        <i> undecided</i>, and the place is named.
      </>
    ),
    why: (
      <>
        Residues over <Formula tex="\Q" /> are compared as over <Formula tex="\Q" />, residues over number fields as
        over number fields. Canonical forms are not promised.
      </>
    ),
    example: { field: 'Q(t)', statement: '[t^2+1][t] = [t^2+1][-t] + [t^2+1][-1] + eta[t^2+1][-1][-t]' },
  },
  {
    name: <>number fields</>,
    write: ['Q[w]/(w^2-5)'],
    compared: (
      <>
        Degree 1 exactly; in degrees 0 and below rank, discriminant, signatures and Hilbert symbols at every prime; from
        degree 3 on signatures. In degree 2 Hilbert and tame symbols separate, and an equality needs a proof by
        Steinberg relations; otherwise it stays undecided. Residues at primes of a number field are not offered yet.
      </>
    ),
    why: (
      <>
        Hasse and Minkowski (Lam, <i>Introduction to Quadratic Forms over Fields</i>, VI.3), Bass and Tate for{' '}
        <Formula tex="n \ge 3" />, and the pull-back theorem.
      </>
    ),
    example: { field: 'Q[w]/(w^2-5)', statement: '<w> + <-w> = h' },
  },
  {
    name: <i>any field</i>,
    write: ['any'],
    compared: (
      <>
        Every degree. Letters are units of a field that is not specified, and so is every entry; <code>char = p</code>{' '}
        may be assumed. Entries that are monomials, ± a product of powers of letters, are complete; so is one letter
        where <Formula tex="\Q(t)" /> is, and no letter as <Formula tex="\Q" />. Sums of several letters are proved by
        Steinberg relations among their factors, or refuted at values in some field; where both searches end at their
        limits the verdict is <i>undecided</i>.
      </>
    ),
    why: (
      <>
        A claim about every field fails when it fails for one, and a sum of relations is zero in every field. In
        independent letters the words <Formula tex="\eta^m[p_S]" />, <Formula tex="[-1]^k[p_S]" /> and{' '}
        <Formula tex="\eta[-1][p_S]" /> form a basis, by the sequence for <Formula tex="k(t)" /> (Morel,{' '}
        <i>
          <Formula tex="\mathbb{A}^1" />
          -Algebraic Topology over a Field
        </i>
        , ch. 3), one letter after the other. A statement that holds there holds in every field, by specialisation.
      </>
    ),
    example: { field: 'any', statement: '[a][b] = [a+b][-b/a]' },
  },
];

/** What is complete over which field, why, and where that is published. */
export function Fields() {
  return (
    <Row side="fields" id="fields" className="sec ruled">
      <div className="prose">
        <p>
          Over each of these fields the comparison is complete, but where the table says what stays open: when no
          difference is found, there is none. The <b>pull-back theorem</b> stands behind all of them: two classes of
          degree <Formula tex="n" /> are equal if and only if they are equal in Milnor K-theory{' '}
          <Formula tex="K_n^{\mathrm M}(F)" /> and in the Witt ring <Formula tex="W(F)" /> (Morel, Comment. Math. Helv.
          79, 2004; Gille, Scully and Zhong, Adv. Math. 286, 2016).
        </p>
        <Ledger
          caption="Fields and what is compared over them"
          head={['field', 'what is compared', 'why that is complete']}
          narrow="stack"
          className="fields"
        >
          {rows.map((row) => (
            <tr key={row.write[0]}>
              <td>
                <span className="st">{row.name}</span>
                <span className="nm">
                  {row.write.map((name) => (
                    <code key={name}>{name}</code>
                  ))}
                </span>
              </td>
              <td className="text">
                {row.compared} <Try {...row.example} />
              </td>
              <td className="text quiet">{row.why}</td>
            </tr>
          ))}
        </Ledger>
        <p>
          For <Formula tex="q = p^d" /> with <Formula tex="d \ge 2" /> the letter <code>z</code> generates{' '}
          <Formula tex="\F_q" />; its modulus is the least monic irreducible polynomial of degree <Formula tex="d" />,
          coefficients compared from the top as integers <Formula tex="0 \dots p-1" />, and every answer names it.{' '}
          <code>z</code> generates the field; it need not generate its units. With a modulus of your own any letter will
          do.
        </p>
        <p id="not-decided">
          Rational functions over a number field or over rational functions, such as <code>Q(s)(t)</code>, and number
          fields over number fields are read in full and then refused. They are not answered by a guess.
        </p>
      </div>
    </Row>
  );
}
