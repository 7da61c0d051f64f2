import { afterOperand, operand, operation, spell } from './expected';
import type { Finding, Situation } from './situation';

/** What is wrong where the sign itself cannot stand in this part of the language, whatever came before it. */
export const misplacedSign = (situation: Situation): Finding | undefined =>
  decimal(situation) ??
  unknownSign(situation) ??
  letterOutside(situation) ??
  fraction(situation) ??
  misplaced(situation);

/** `0.25`: decimals are never exact enough to be meant. */
function decimal({ text, here, before }: Situation): Finding | undefined {
  if (!here || text.slice(here.start, here.end) !== '.') return undefined;
  const [last] = before;
  const whole = last?.kind === 'number' && last.end === here.start ? text.slice(last.start, last.end) : '';
  const digits = /^[0-9]+/.exec(text.slice(here.end))?.[0] ?? '';
  if (whole === '' && digits === '') return undefined;
  const written = `${whole}.${digits}`;
  let numerator = BigInt(whole + digits);
  let denominator = 10n ** BigInt(digits.length);
  for (let [a, b] = [numerator, denominator]; ; [a, b] = [b, a % b]) {
    if (b !== 0n) continue;
    numerator /= a;
    denominator /= a;
    break;
  }
  const exact = denominator === 1n ? String(numerator) : `${numerator}/${denominator}`;
  const place = { offset: here.start - whole.length, offending: written };
  if (before[whole === '' ? 0 : 1]?.kind === 'hat') {
    return {
      ...place,
      detail: `${written} is a decimal, and an exponent is an integer.`,
      expected: [{ text: 'an integer' }],
    };
  }
  if (!here.inEntry) {
    return {
      ...place,
      detail: `${written} is a decimal, and the coefficient of a word is an integer.`,
      expected: [{ text: 'an integer' }],
    };
  }
  return {
    ...place,
    detail: `${written} is a decimal: write the fraction ${exact}.`,
    expected: [{ text: `\`${exact}\`` }],
  };
}

function unknownSign(situation: Situation): Finding | undefined {
  const { here, complete } = situation;
  const expected = complete ? afterOperand(situation) : operand(situation);
  if (here?.kind === 'command') return { detail: `The command ${spell(situation, here)} is not known here.`, expected };
  if (here?.kind === 'other') return { detail: `The sign ${spell(situation, here)} has no meaning here.`, expected };
  return undefined;
}

function letterOutside(situation: Situation): Finding | undefined {
  const { here, before, text } = situation;
  if (here?.kind !== 'letter' || here.inEntry || before[0]?.kind === 'underline' || before[0]?.kind === 'hat')
    return undefined;
  const run = /^[a-zA-Z]+/.exec(text.slice(here.start))?.[0] ?? spell(situation, here);
  const letters = spell(situation, here);
  if (before[0]?.kind === 'open' && before[1]?.kind === 'hat') return undefined;
  return letters.length === 1
    ? {
        detail: `The letter ${letters} stands outside a bracket: letters are entries, as in [${letters}].`,
        expected: [{ text: `\`[${letters}]\`` }],
      }
    : { detail: `${run} is no word of the language.`, offending: run, expected: operand(situation) };
}

function fraction(situation: Situation): Finding | undefined {
  const [last, ...earlier] = situation.before;
  const brace = { text: '`{`', insert: '{' };
  if (last?.kind === 'fraction') {
    return { detail: `After ${spell(situation, last)} the numerator stands in braces.`, expected: [brace] };
  }
  if (last?.kind !== 'close' || last.bracket !== 'brace') return undefined;
  // From the closing brace back to its partner.
  let depth = 1;
  const opening = earlier.findIndex((token) => {
    if (token.bracket === 'brace') depth += token.kind === 'close' ? 1 : -1;
    return depth === 0;
  });
  const command = earlier[opening + 1];
  if (command?.kind !== 'fraction' || opening < 0) return undefined;
  return { detail: `The denominator of ${spell(situation, command)} stands in braces.`, expected: [brace] };
}

const insideElement = ({ open }: Situation): string =>
  open.length > 0 ? 'inside an entry, which is an element of the field' : 'in an element of the field';

/** Signs that stand in the wrong part of the language. */
function misplaced(situation: Situation): Finding | undefined {
  const { here, open, reading, complete, inEntry } = situation;
  const sign = spell(situation, here);
  const outermost = open.length === 0;
  if (here?.kind === 'equals' && outermost && complete && reading === 'expression') {
    return { detail: 'One expression is read here, and = makes a statement of two.', expected: [operation] };
  }
  if (here?.kind === 'semicolon' && outermost && complete && reading === 'expression') {
    return { detail: 'One expression is read here, without hypotheses.', expected: [operation] };
  }
  if (here?.kind === 'unequal' && !inEntry) {
    return {
      detail: `${sign} stands only in a hypothesis, after a semicolon.`,
      expected: [{ text: '`=`', insert: '=' }],
    };
  }
  if (here?.kind === 'over' && !inEntry && complete) {
    return {
      detail: 'A word cannot be divided: / stands inside a bracket only.',
      expected: [{ text: 'an operation such as `+` `*` `^`' }],
    };
  }
  if (here?.kind === 'open' && inEntry && here.bracket !== 'group' && here.bracket !== 'brace') {
    return {
      detail: `A bracket ${sign} cannot stand ${insideElement(situation)}.`,
      expected: complete ? afterOperand(situation) : operand(situation),
    };
  }
  if (here?.kind === 'word' && inEntry) {
    return {
      detail: `${sign} cannot stand ${insideElement(situation)}.`,
      expected: complete ? afterOperand(situation) : operand(situation),
    };
  }
  if (here?.kind === 'blank') {
    return {
      detail: 'A new row goes on with = or a sign, or it would be read as a product with the row before.',
      expected: [
        { text: '`=`', insert: '=' },
        { text: '`+`', insert: '+' },
        { text: '`-`', insert: '-' },
      ],
    };
  }
  if (outermost && complete) return unpaired(situation);
  return undefined;
}

/** Marks around the whole text that do not come in pairs. */
function unpaired(situation: Situation): Finding | undefined {
  const { here, before } = situation;
  const first = before.at(-1);
  if (here?.kind === 'dressing') {
    return {
      detail: `The mark ${spell(situation, here)} has no partner: marks stand around the whole text.`,
      expected: [operation],
    };
  }
  if (here || first?.kind !== 'dressing') return undefined;
  const mark = spell(situation, first);
  const closing = mark.replace('(', ')').replace('[', ']').replace('begin', 'end');
  return {
    detail: `The mark ${mark} is not closed where the text ends.`,
    expected: [{ text: `\`${closing}\``, insert: closing }],
  };
}
