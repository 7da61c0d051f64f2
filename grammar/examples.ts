/** Texts that a rule of quadrel.ohm reads to their end, and texts that it does not. */
export interface RuleExamples {
  readonly accepted: readonly string[];
  readonly refused: readonly string[];
}

/** Examples for the rules of words, statements and field elements, in the order of the grammar. */
export const examples: Readonly<Record<string, RuleExamples>> = {
  wholeExpression: {
    accepted: ['[2]', ' $[2][3]$ ', '$$eta$$', '\\(h\\)', '\\[ [2] \\]', '\\begin{align*} [2] \\end{align*}'],
    refused: ['', '$[2]', '[2]$', '[2] = [3]', '\\begin{align}[2]'],
  },
  wholeStatement: {
    accepted: ['[2]', '[2] = [3] = [5]', '\\begin{aligned} [4] &= h[2] \\\\ &= 2_{\\varepsilon}[2] \\end{aligned}'],
    refused: ['[2] =', '= [2]', '[2] \\\\ [3]', '[2] == [3]'],
  },
  wholeElement: { accepted: ['t', '$\\frac{1}{2}$', '-1'], refused: ['[t]', 'eta^', '0.5'] },
  wholeCondition: { accepted: ['a != 1', 'char != 2'], refused: ['a', 'char', 'a < b'] },
  wholeFieldName: { accepted: ['Q', '$\\mathbb{F}_9$', ' any '], refused: ['', 'F_-3', 'Z'] },
  environment: { accepted: ['align', 'align*', 'aligned', 'equation*'], refused: ['matrix', 'align**'] },

  statement: { accepted: ['[a][1-a] = 0 ; a != 1', '[a] ; char != 2, a ≠ b'], refused: ['[a] ;', '[a] = 0 , a != 1'] },
  hypotheses: { accepted: ['; a != 1', ';a=b, char=3'], refused: ['', ';', '; a != 1;'] },
  condition: {
    accepted: [
      'a != b',
      'a ≠ b',
      'a \\ne b',
      'a \\neq b',
      'a \\not= b',
      'a = 2b',
      'char = 3',
      '\\operatorname{char} \\ne 2',
    ],
    refused: ['a < b', 'char != a', 'char 2', 'a \\nee b'],
  },
  relation: { accepted: ['=', '!=', '≠', '\\ne ', '\\not ='], refused: ['==', '<', '\\ni'] },
  characteristic: { accepted: ['char', '\\mathrm{char}', '\\operatorname{ char } '], refused: ['chart', 'Char'] },

  sum: {
    accepted: ['[2]', '-[2] + [3] - <5>', '[2] − [3]', '[2] - -[3]', '+[2]', '[2]+\n[3]', '1', '0'],
    refused: ['', '[2] +', '+', '---[2]', '[2]+*[3]'],
  },
  product: {
    accepted: ['2[5]', '2*[5]', '2·[5]', '2\\cdot[5]', '2 × [5]', '[2]*-[3]', 'eta eps h', '3eta^2h[2]', '[2] (1 + h)'],
    refused: ['2**[5]', '[2]/[3]', '*[2]', '[2] x'],
  },
  factor: { accepted: ['[2]^2', 'eta^{3}', 'η²', '(1+h)^(2)', 'h ^ 2', '[2]^-1'], refused: ['[2]^', '[2]^x', '^2'] },
  group: { accepted: ['(1)', '( [2] - [3] )', '((h))'], refused: ['()', '(1', '{1}'] },
  symbol: {
    accepted: ['[2]', '[a, b, c]', '[ -1 ]', '\\lbrack 2\\rbrack', '[2\\right]', '[t^2-1]'],
    refused: ['[]', '[2,]', '[,2]', '[2', '[2)', '[[2]]', '[0.5]'],
  },
  angle: { accepted: ['<2>', '< a, b >'], refused: ['<>', '<<2>', '<a', '<a>>', '<[2]>'] },
  pfister: { accepted: ['<<a>>', '<<a, b>>'], refused: ['<<a>', '<<>>', '< <a>>'] },
  otherAngle: { accepted: ['⟨a⟩', '\\langle a, b\\rangle'], refused: ['⟨a>', '⟪a⟩', '\\langlea\\rangle'] },
  otherPfister: {
    accepted: ['⟪a, b⟫', '⟨⟨a⟩⟩', '\\langle\\!\\langle a\\rangle\\!\\rangle', '\\langle\\langle a\\rangle\\rangle'],
    refused: ['⟪a⟩', '\\langle\\!\\langle a\\rangle', '⟨a⟩⟩'],
  },
  eta: { accepted: ['eta', 'η', '\\eta'], refused: ['et', '\\etab', 'Eta'] },
  epsilon: { accepted: ['eps', 'ε', 'ϵ', '\\varepsilon', '\\epsilon'], refused: ['ep', '\\eps', 'epsilon'] },
  hyperbolic: { accepted: ['h'], refused: ['H', 'hh'] },
  coefficient: {
    accepted: ['0', '12', '3_eps', '3_ε', '3_{\\varepsilon}', '3 _ { eps }'],
    refused: ['-1', '3_', '3_x', '1.5'],
  },
  signedCount: { accepted: ['(-2)_eps', '(2)_{\\varepsilon}', '( −2 )_ε'], refused: ['(-2)', '-2_eps', '(1+1)_eps'] },

  element: {
    accepted: ['2', 't^2-1', '-a', '1/(2t)', '(1/2)t', '2*3 + x_1', 'a - -b', 'h', 'eta'],
    refused: ['', 'a+', '[a]', 'a//b', 'η'],
  },
  elementProduct: {
    accepted: ['2t', 'ab', 'a(b+1)', 'a*b/c', '1/2*1/t', '2/-3', '\\frac{1}{2}t', 'a/b/c'],
    refused: ['/2', 'a*', 'a**b', 'a:b'],
  },
  elementFactor: {
    accepted: ['t^2', 't^-1', 't^(-1)', 't^{-1}', 't⁻¹', '(a+b)²'],
    refused: ['t^', 't^a', 't^{2+1}', 't^1/2'],
  },
  fraction: {
    accepted: ['\\frac{a}{b}', '\\tfrac {1} {2}', '\\dfrac{-a}{b+1}'],
    refused: ['\\frac12', '\\frac{1}2', '\\frac{}{2}'],
  },
  fieldLetter: {
    accepted: ['a', 'Z', 'x1', 'x_1', 'x_{1}', 'x₁', "u'", "u''", 'u′', 'u^{\\prime}', "x_1'"],
    refused: ['ab', 'x_i', 'x_', '1x', 'α'],
  },

  addition: { accepted: ['+', '-', '− ', '–', '+ -'], refused: ['*', '---', '~'] },
  times: { accepted: ['*', '·', '×', '\\cdot ', '\\times', '* -'], refused: ['.', '\\cdots', '/'] },
  over: { accepted: ['/', '∕', '/ -'], refused: [':', '\\over'] },
  exponent: {
    accepted: ['^2', '^ 2', '^{2}', '^(2)', '^-2', '^{-2}', '²', '¹⁰', '⁻³'],
    refused: ['^', '^{}', '^x', '⁻', '**2'],
  },
  signedInteger: { accepted: ['2', '-2', '− 2'], refused: ['+2', '2.5', ''] },

  fieldName: {
    accepted: [
      'Q',
      'R',
      'C',
      'Q_5',
      'F_7',
      'F_{3^2}',
      'F_9[y]/(y^2+z+1)',
      'Q[w]/(w^2-5)',
      'F_7(t)',
      'Q(t)[y]/(y^2-t)',
      'any',
    ],
    refused: ['Z', 'Q(', 'Q(2)', 'Q(s,t)', 'F_9[y]', 'F_9[y]/y', 'F_q', 'Q7', 'R_2'],
  },
  fieldBase: { accepted: ['Q', 'Q_5', 'F_9', 'any', '\\mathrm{any}'], refused: ['Q(t)', 'anything', 'R_3', 'F'] },
  fieldStep: {
    accepted: ['(t)', '( x_1 )', '[y]/(y^2+1)', '[y] / (y)'],
    refused: ['()', '(2)', '[y]', '[y]/y', '(s,t)'],
  },
  rationalsSign: {
    accepted: ['Q', 'ℚ', '\\mathbb{Q}', '\\mathbb Q', '\\mathbf{Q}', '\\Q'],
    refused: ['q', '\\mathcal{Q}'],
  },
  realsSign: { accepted: ['R', 'ℝ', '\\mathbb{R}'], refused: ['r'] },
  complexesSign: { accepted: ['C', 'ℂ', '\\mathbb{C}'], refused: ['c'] },
  finiteSign: { accepted: ['F', '𝔽', '\\mathbb{F}', '\\mathbf F'], refused: ['GF', 'f'] },
  primeIndex: { accepted: ['_5', '_{5}', '₅'], refused: ['5', '_', '_p'] },
  orderIndex: { accepted: ['_9', '_{9}', '_{3^2}', '_{3^{2}}', '₉'], refused: ['_3^2', '_{3^}', '_-3'] },

  gap: {
    accepted: ['', ' \t\n', '\\, \\! \\; \\quad', '~&~', '\\left', '\\bigl', '\u00a0\u2009'],
    refused: ['a', '\\lefty', '\\alpha', '_'],
  },
  texBlank: { accepted: ['\\,', '\\right', '\\Bigg', '\\\\', '\\\\[4pt]'], refused: ['\\', '\\rightarrow', '\\\\[2]'] },
};
