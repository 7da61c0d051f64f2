import { diagnoseField } from './diagnose-field';
import { missingOperand } from './diagnose-operand';
import { misplacedSign } from './diagnose-sign';
import { afterOperand, openText, operand, operation, spell } from './expected';
import { ReadingError } from './reading-error';
import { type Finding, type Reading, type Situation, situationAt } from './situation';

export type { Reading } from './situation';

/** What to say about a text that the grammar does not read past `offset`. */
export function diagnose(text: string, offset: number, reading: Reading): ReadingError {
  const situation = situationAt(text, offset, reading);
  const finding = find(situation);
  return new ReadingError(text, {
    detail: finding.detail,
    offset: finding.offset ?? situation.offset,
    offending: finding.offending ?? spell(situation, situation.here),
    expected: finding.expected,
    open: finding.open,
  });
}

function find(situation: Situation): Finding {
  const { here, before } = situation;
  if (situation.reading === 'field') return diagnoseField(situation);
  if (!here && before.every((token) => token.kind === 'dressing')) {
    return { detail: 'Nothing is written here.', expected: operand(situation) };
  }
  return misplacedSign(situation) ?? (situation.complete ? afterComplete(situation) : missingOperand(situation));
}

/** An operand stands before the place, and what follows does not go on from it. */
function afterComplete(situation: Situation): Finding {
  const { here, open, reading, before } = situation;
  const sign = spell(situation, here);
  const innermost = open.at(-1);
  const exponent = exponentOf(situation);
  if (exponent) return exponent;
  if (innermost && (!here || ['equals', 'semicolon', 'close', 'comma', 'dressing', 'unequal'].includes(here.kind))) {
    return {
      detail: `The bracket ${openText(situation, innermost)} is still open ${situation.where}.`,
      expected: afterOperand(situation),
      open: { start: innermost.start, end: situation.offset },
    };
  }
  if (here?.kind === 'close') return { detail: `No bracket is open that ${sign} could close.`, expected: [operation] };
  if (here?.kind === 'comma') {
    return { detail: 'A comma stands between entries of a bracket, and none is open here.', expected: [operation] };
  }
  if (here?.kind === 'underline') {
    return {
      detail: 'Only an integer has the index eps, as in 3_eps, and only a letter has a number as index, as in x_1.',
      expected: afterOperand(situation),
    };
  }
  if (here?.kind === 'open' && here.bracket === 'brace') {
    return { detail: 'Braces stand only after ^, after _ and after \\frac.', expected: [{ text: '`(`', insert: '(' }] };
  }
  if (situation.inEntry && !innermost && reading !== 'element') {
    const named = before[0]?.kind === 'word';
    const relation = [
      { text: '`!=`', insert: '!= ' },
      { text: '`=`', insert: '= ' },
    ];
    if (named)
      return { detail: `After ${spell(situation, before[0])} stands != or = and a prime.`, expected: relation };
    return {
      detail: `A hypothesis has two sides with != or = between them, and one is missing ${situation.where}.`,
      expected: [...relation, operation],
    };
  }
  return {
    detail: here ? `${sign} cannot stand here.` : 'The text ends too early.',
    expected: afterOperand(situation),
  };
}

/** Inside the braces or parentheses of an exponent. */
function exponentOf(situation: Situation): Finding | undefined {
  const innermost = situation.open.at(-1);
  const index = situation.before.findIndex((token) => token === innermost);
  const hat = situation.before[index + 1];
  if (!innermost || hat?.kind !== 'hat' || index !== 1) return undefined;
  const sign = situation.here?.kind;
  if (sign === undefined || ['close', 'equals', 'semicolon', 'comma'].includes(sign)) return undefined;
  return {
    detail: `An exponent is one integer, and it goes on ${situation.where}.`,
    expected: afterOperand(situation).slice(0, 1),
    open: { start: innermost.start, end: situation.offset },
  };
}
