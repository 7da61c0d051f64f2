// Written from quadrel.ohm by write-source.ts, so that the grammar needs no file system where it runs.
export const quadrelSource = String.raw`/*
  What a person may type: words of Milnor–Witt K-theory, statements with their hypotheses, field elements, names of fields.

  Every rule is lexical and says where white space may stand (gap), because that is twice as fast as implicit skipping and
  a statement may have tens of thousands of characters. A rule whose name says nothing else ends before the white space that
  follows it; sum, product, element, … end after it. Spellings of TeX and Unicode are read where they stand, so that
  every node knows its place in the text as it was typed. Accepted and refused examples of each rule: examples.ts.
*/
Quadrel {
  wholeExpression = dressed<sum>
  wholeStatement  = dressed<statement>
  wholeElement    = dressed<element>
  wholeCondition  = dressed<condition>
  wholeFieldName  = dressed<fieldName>

  // Mathematics marks and environments around the whole say nothing.
  dressed<body> = gap (between<"$$", body, "$$"> | between<"$", body, "$"> | between<"\\(", body, "\\)">
                | between<"\\[", body, "\\]"> | between<beginning, body, ending> | body) gap
  between<left, body, right> = left gap body right
  beginning   = "\\begin" gap braced<environment>
  ending      = "\\end" gap braced<environment>
  environment = ("align" | "equation" | "gather" | "multline") "ed"? "*"?

  // ---- statements

  statement  = sum (equals sum)* hypotheses?
  hypotheses = ";" gap condition ("," gap condition)*
  equals     = "=" gap
  condition  = characteristic relation digits gap                                 -- characteristic
             | ~characteristic element relation element                            -- elements
  relation   = ("!=" | "≠" | "\\neq" ~latin | "\\ne" ~latin | struckEquals | "=") gap
  struckEquals = "\\not" gap "="
  characteristic = ("char" ~latin | uprightChar) gap
  uprightChar    = ("\\operatorname" | "\\mathrm") gap braced<"char">

  // ---- words
  // What begins with ~ and a range of characters only spares the parser alternatives that cannot stand there.

  sum     = (~(".".."~") addition)? product (~(".".."~") addition product)*
  product = factor (~(")" | "+".."-" | "=".."?" | "]") (times | juxtaposed) factor)*
  factor  = ( symbol | coefficient | angle | eta | hyperbolic | epsilon | signedCount | group | pfister
            | otherAngle | otherPfister) gap (~(" ".."]") exponent)*
  group   = "(" gap sum ")"

  symbol       = ("[" | "\\lbrack" ~latin) gap element ("," gap element)* ("]" | "\\rbrack" ~latin)
  angle        = "<" ~"<" gap element ("," gap element)* ">"
  pfister      = "<<" gap element ("," gap element)* ">>"
  otherAngle   = ~pfisterOpen angleOpen gap element ("," gap element)* angleClose
  otherPfister = pfisterOpen gap element ("," gap element)* pfisterClose

  eta          = "eta" | "η" | "𝜂" | "\\eta" ~latin
  epsilon      = "eps" | "ε" | "ϵ" | "𝜀" | "𝜖" | "\\varepsilon" ~latin | "\\epsilon" ~latin
  hyperbolic   = "h"
  coefficient  = ("0".."9")+ (gap "_" gap epsilonIndex)?
  signedCount  = "(" gap signedInteger gap ")" gap "_" gap epsilonIndex
  epsilonIndex = epsilon | braced<epsilon>

  // ---- field elements

  element        = (~(".".."~") addition)? elementProduct (~(".".."~") addition elementProduct)*
  elementProduct = elementFactor (~(")" | "+".."-" | "=".."?" | "]") (times | over | juxtaposed) elementFactor)*
  elementFactor  = (integer | fieldLetter | elementGroup | fraction) gap (~(" ".."]") exponent)*
  elementGroup   = "(" gap element ")"
  fraction       = ("\\frac" | "\\tfrac" | "\\dfrac") gap braced<element> gap braced<element>
  integer        = ("0".."9")+
  fieldLetter    = latin prime* index? prime*
  latin          = "a".."z" | "A".."Z"
  index          = digits | subscriptDigits | lowered
  lowered        = "_" gap (digits | braced<digits>)
  prime          = "'" | "′" | "’" | "^\\prime" ~latin | raisedPrime
  raisedPrime    = "^" gap braced<"\\prime">

  // ---- operations

  addition   = ("+" | minus) gap (~(".".."~") ("+" | minus) gap)?
  times      = ("*" | ~(" ".."[" | "]".."~") otherTimes) gap (~(".".."~") addition)?
  over       = ("/" | "∕" | "⁄") gap (~(".".."~") addition)?
  juxtaposed =
  exponent   = (raised | superscript) gap
  raised     = "^" gap (signedInteger | braced<signedInteger> | parenthesised<signedInteger>)
  signedInteger = (minus gap)? digits
  digits     = ("0".."9")+

  // ---- other spellings of one sign

  minus         = "-" | "−" | "‐".."―" | "﹣" | "－"
  otherTimes    = "·" | "⋅" | "×" | "∗" | "∙" | "\\cdot" ~latin | "\\times" ~latin | "\\ast" ~latin
  angleOpen     = "⟨" | "\u{2329}" | "\u{3008}" | "\\langle" ~latin
  angleClose    = "⟩" | "\u{232A}" | "\u{3009}" | "\\rangle" ~latin
  pfisterOpen (a bracket)
                = "⟪" | "《" | twice<"⟨"> | twice<"\\langle"> ~latin | "\\llangle" ~latin
  pfisterClose (a closing bracket)
                = "⟫" | "》" | twice<"⟩"> | twice<"\\rangle"> ~latin | "\\rrangle" ~latin
  superscript   = "⁻"? ("⁰" | "¹" | "²" | "³" | "⁴".."⁹")+
  subscriptDigits = ("₀".."₉")+

  // ---- names of fields

  fieldName = fieldBase gap fieldStep*
  fieldBase = rationalsSign gap primeIndex                                         -- padics
            | finiteSign gap orderIndex                                            -- finite
            | rationalsSign                                                        -- rationals
            | realsSign                                                            -- reals
            | complexesSign                                                        -- complexes
            | ("any" ~latin | boldface<"any">)                                     -- any
  fieldStep = "(" gap fieldLetter gap ")" gap                                      -- functions
            | "[" gap fieldLetter gap "]" gap ("/" | "∕" | "⁄") gap "(" gap element ")" gap -- extension
  rationalsSign = "Q" | "ℚ" | "𝐐" | boldface<"Q"> | "\\QQ" ~latin | "\\Q" ~latin
  realsSign     = "R" | "ℝ" | "𝐑" | boldface<"R"> | "\\RR" ~latin | "\\R" ~latin
  complexesSign = "C" | "ℂ" | "𝐂" | boldface<"C"> | "\\CC" ~latin | "\\C" ~latin
  finiteSign    = "F" | "𝔽" | "𝐅" | boldface<"F"> | "\\FF" ~latin | "\\F" ~latin
  boldface<name> = ("\\mathbb" | "\\mathbf" | "\\mathrm") gap (name | braced<name>)
  primeIndex = subscriptDigits | lowered
  orderIndex = "_" gap braced<primePower>                                          -- power
             | primeIndex
  primePower = digits gap "^" gap (digits | braced<digits>)

  braced<body> = "{" gap body gap "}"
  parenthesised<body> = "(" gap body gap ")"
  twice<mark>  = mark gap mark

  // ---- white space

  // A row break stands for white space only where the next row goes on with a sign or ends, so that the rows of two separate
  // equalities never run together into one product.
  gap      = (" " | ~("'".."[" | "]".."}") (blank | texBlank))*
  blank    = "\u{9}".."\u{D}" | "~" | "&" | "\u{A0}" | "\u{2000}".."\u{200B}" | "\u{2028}".."\u{2029}" | "\u{202F}"
           | "\u{205F}".."\u{2064}" | "\u{3000}" | "\u{FEFF}"
  texBlank (white space)
           = "\\" ("," | "!" | ";" | ":" | ">" | " " | "\n")                       -- sign
           | "\\" texBlankWord ~latin                                              -- word
           | "\\\\" rowSpace? &rowStart                                            -- row
  texBlankWord = "left" | "right" | "middle" | "biggl" | "biggr" | "bigg" | "bigl" | "bigr" | "big"
               | "Biggl" | "Biggr" | "Bigg" | "Bigl" | "Bigr" | "Big" | "qquad" | "quad"
               | "thinspace" | "nonumber" | "notag" | "displaystyle" | "textstyle" | "mathopen{}" | "mathclose{}"
  rowSpace = "[" digits ("." digits)? ("pt" | "em" | "ex" | "mm" | "cm") "]"
  rowStart = gap ("=" | "+" | minus | times | ";" | "," | "\\end" | "\\]" | "$" | end)
}
`;
