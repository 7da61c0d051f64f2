import type { ReactNode } from 'react';
import { Ledger } from '../../_components/ledger/ledger';
import { Formula } from '../../_components/math/formula';
import { Row } from '../../_components/shell/row';
import { Try } from './try';

interface Construct {
  readonly write: readonly string[];
  readonly or: readonly string[];
  readonly means: ReactNode;
  readonly example: { field?: string; statement: string };
}

const constructs: readonly Construct[] = [
  {
    write: ['[a]', '[a, b, c]'],
    or: [],
    means: (
      <>
        the symbol, of degree 1; the product <Formula tex="[a][b][c]" />
      </>
    ),
    example: { statement: '[2, 3][5] = [2][3][5]' },
  },
  {
    write: ['eta'],
    or: ['η', '\\eta'],
    means: (
      <>
        <Formula tex="\eta" />, of degree −1
      </>
    ),
    example: { statement: '[6] = [2] + [3] + eta[2][3]' },
  },
  {
    write: ['<a>', '<a, b>'],
    or: ['⟨a⟩', '\\langle a\\rangle'],
    means: (
      <>
        <Formula tex="\q{a} = 1 + \eta[a]" />; the sum <Formula tex="\q{a} + \q{b}" />
      </>
    ),
    example: { statement: '<2> + <3> = <5> + <30>' },
  },
  {
    write: ['<<a>>', '<<a, b>>'],
    or: ['⟪a⟫', '\\langle\\!\\langle a\\rangle\\!\\rangle'],
    means: (
      <>
        <Formula tex="\pf{a} = 1 - \q{a}" />; the product <Formula tex="\pf{a}\pf{b}" />
      </>
    ),
    example: { statement: '<<2, 3>> = (1 - <2>)(1 - <3>)' },
  },
  {
    write: ['h'],
    or: [],
    means: (
      <>
        <Formula tex="2 + \eta[-1] = 1 + \q{-1}" />, the hyperbolic plane
      </>
    ),
    example: { statement: 'eta*h = 0' },
  },
  {
    write: ['eps'],
    or: ['ε', '\\varepsilon'],
    means: <Formula tex="\e = -\q{-1}" />,
    example: { statement: '[2][3] = eps[3][2]' },
  },
  {
    write: ['3_eps', '(-2)_eps'],
    or: ['3_ε', '3_{\\varepsilon}'],
    means: (
      <>
        <Formula tex="n_\e = 1 + \q{-1} + 1 + \cdots" /> with <Formula tex="n" /> terms;{' '}
        <Formula tex="(-n)_\e = -\q{-1}\,n_\e" />
      </>
    ),
    example: { statement: '[8] = 3_eps[2]' },
  },
  {
    write: ['2[a]', '2*[a]'],
    or: ['2·[a]', '2\\cdot[a]'],
    means: <>a product; things side by side are multiplied, integers are coefficients</>,
    example: { statement: '[2][-1] + 3[5][7] - eta[6]' },
  },
  {
    write: ['[a]^2', 'eta^3', '(…)^2'],
    or: ['\\eta^{3}'],
    means: <>a power, with an exponent from 0 to 64</>,
    example: { statement: '[5]^2 = [5][-1]' },
  },
];

function Constructs() {
  return (
    <Ledger
      caption="What one may write"
      head={['write', 'it means', 'on the bench']}
      narrow="stack"
      className="constructs"
    >
      {constructs.map(({ write, or, means, example }) => (
        <tr key={write[0]}>
          <td>
            {write.map((text) => (
              <code key={text}>{text}</code>
            ))}
            {or.length > 0 && (
              <span className="nm">
                or{' '}
                {or.map((text) => (
                  <code key={text}>{text}</code>
                ))}
              </span>
            )}
          </td>
          <td className="text">{means}</td>
          <td>
            <Try {...example} />
          </td>
        </tr>
      ))}
    </Ledger>
  );
}

/** Every construct of the language, each with an example. */
export function Language() {
  return (
    <Row side="language" sideClass="to-table" id="language" className="">
      <div className="prose">
        <Constructs />
        <p>
          Text pasted from a paper is understood: dollar signs around the whole, <code>\left</code> and{' '}
          <code>\right</code>, thin spaces, the minus sign and dashes of a typesetter, <code>\times</code>, superscript
          digits, <code>\mathbb&#123;Q&#125;</code> and <code>ℚ</code>.
        </p>
        <h3 id="statements">Statements and chains</h3>
        <p>
          A statement is two expressions with <code>=</code> between them. More than two make a chain, also pasted as
          rows of <code>align*</code> joined by <code>&amp;=</code>. Every step of a chain is judged by itself and the
          first wrong one is marked: <Try statement="[6] = [2] + <2>[3] = [2] + [3]" />.
        </p>
        <h3 id="hypotheses">Hypotheses</h3>
        <p>
          Conditions follow after a semicolon, with commas between them: <code>a != b</code>, <code>a = b</code>,{' '}
          <code>char != p</code> or <code>char = p</code>. Over <code>any</code> they restrict what is claimed:{' '}
          <Try field="any" statement="2eta[a] = 0 ; char = 2" />. An equation is solved for a letter whose coefficient
          is a monomial up to sign.
        </p>
        <h3 id="entries">Entries of a bracket</h3>
        <p>
          Inside a bracket stands an element of the field: integers, letters, <code>+ - * / ^</code>, parentheses,
          things side by side, and <code>\frac&#123;a&#125;&#123;b&#125;</code>. Exponents are integers and may be
          negative: <Try statement="[2^-1] = -<2>[2]" />. A letter is one Latin letter with an index or primes if you
          like; <code>x1</code> and <code>x_1</code> are the same letter. Inside a bracket <code>h</code> is a letter.
        </p>
        <p>
          Three things are refused because readers disagree about them: decimals; a product right after a slash, as in{' '}
          <code>1/2t</code> (write <code>1/(2t)</code> or <code>(1/2)t</code>); and a tower of exponents, as in{' '}
          <code>2^3^2</code>. An entry must be a unit: <code>[0]</code> and <code>[1-1]</code> are errors, and over{' '}
          <Formula tex="\F_7" /> so is <code>[14]</code>.
        </p>
        <h3 id="sizes">Sizes</h3>
        <p>
          A text has at most 20 000 characters, brackets nest at most 200 deep, and an exponent inside an entry is at
          most 10 000 in size. A question on the bench has two seconds of computing time. Past a limit you get a refusal
          that says which, never a guess.
        </p>
      </div>
    </Row>
  );
}
