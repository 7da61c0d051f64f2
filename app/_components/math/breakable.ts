/** Commands that stand between two things: TeX would break the line after them. */
const operators = new Set([
  '\\cdot',
  '\\times',
  '\\equiv',
  '\\in',
  '\\cong',
  '\\subset',
  '\\oplus',
  '\\wedge',
  '\\le',
  '\\ge',
  '<',
  '>',
]);
const opening = new Set(['[', '(', '\\langle', '\\lbrack', '\\lparen', '\\{']);
const closing = new Set([']', ')', '\\rangle', '\\rbrack', '\\rparen', '\\}']);
/** At these a line may break, and the sign opens the new line. */
const breaking = new Set(['+', '-', '=', '\\ne', '\\neq', '\\to', '\\mapsto']);

/**
 * Allows a line to break before + − = (and arrows) outside every bracket and nowhere else, where TeX would break after any operator.
 * Takes and returns TeX; what stands inside braces is left alone, for no line breaks there.
 */
export function breakable(tex: string): string {
  const tokens = tex.match(/\\[a-zA-Z]+\s*|\\.|\s+|[^\\\s]/gu) ?? [];
  let depth = 0;
  let braces = 0;
  let before = '';
  let out = '';
  for (const token of tokens) {
    const sign = token.trim();
    if (sign === '') {
      out += token;
      continue;
    }
    if (sign === '{') braces += 1;
    if (sign === '}') braces -= 1;
    if (opening.has(sign)) depth += 1;
    if (closing.has(sign)) depth = Math.max(0, depth - 1);
    const between = before !== '' && !opening.has(before) && !breaking.has(before) && !operators.has(before);
    const isOperator = breaking.has(sign) || operators.has(sign);
    if (braces === 0 && isOperator && between) {
      const mayBreak = depth === 0 && breaking.has(sign);
      out += `${mayBreak ? '\\allowbreak ' : ''}${token}\\nobreak `;
    } else {
      out += token;
    }
    before = sign;
  }
  return out;
}
