import { missingOperand } from './diagnose-operand';
import { closingOf, openText, operation, spell } from './expected';
import type { Finding, Situation } from './situation';
import type { Token } from './tokens';

const names = [{ text: 'a name such as `Q`, `R`, `C`, `Q_5`, `F_9`, `F_9[y]/(y^2+z+1)`, `Q(t)` or `any`' }];

/** What is wrong with the name of a field. */
export function diagnoseField(situation: Situation): Finding {
  const { text, offset, here, before, where } = situation;
  const read = text.slice(0, offset).replace(/[\s${}]|\\mathbb|\\mathbf/g, '');
  if (read === '') {
    return here
      ? {
          detail: `No name of a field begins with ${/^[a-z]+/i.exec(text.slice(offset))?.[0] ?? spell(situation, here)}.`,
          expected: names,
        }
      : { detail: 'The name of a field is missing.', expected: names };
  }
  if (/^(?:F|𝔽|\\F|\\FF)_?$/.test(read)) {
    return {
      detail: `After F_ the number of elements is missing ${where}.`,
      expected: [{ text: 'a power of a prime such as `7` or `9`' }],
    };
  }
  if (/^(?:Q|ℚ|\\Q|\\QQ)_$/.test(read)) {
    return { detail: `After Q_ a prime is missing ${where}.`, expected: [{ text: 'a prime such as `5`' }] };
  }
  const [last, earlier] = before;
  if (last?.kind === 'open' && earlier?.kind !== 'over') {
    return { detail: `A letter is missing ${where}.`, expected: [{ text: 'a letter such as `t`' }] };
  }
  const innermost = situation.open.at(-1);
  if (innermost) return insideBracket(situation, innermost);
  if (last?.kind === 'close' && last.bracket === 'symbol') {
    return {
      detail: `After the letter of an extension its modulus is missing ${where}.`,
      expected: [{ text: '`/(` and a polynomial', insert: '/(' }],
    };
  }
  if (last?.kind === 'over') {
    return {
      detail: `After / the modulus stands in parentheses, and it is missing ${where}.`,
      expected: [{ text: '`(`', insert: '(' }],
    };
  }
  return {
    detail: here
      ? `The name of a field cannot go on with ${spell(situation, here)}.`
      : 'The name of a field is not complete.',
    expected: [{ text: '`(t)` for rational functions' }, { text: '`[y]/(…)` for an extension' }],
  };
}

function insideBracket(situation: Situation, innermost: Token): Finding {
  const { here, before, where, text } = situation;
  const opening = before.indexOf(innermost);
  const inModulus = situation.open.some((token) => before[before.indexOf(token) + 1]?.kind === 'over');
  if (inModulus && !situation.complete) return missingOperand({ ...situation, inEntry: true });
  if (here?.kind === 'comma' && opening === 1) {
    return {
      detail: 'A field of rational functions has one letter here, and a comma follows it.',
      expected: [{ text: '`)` to close it', insert: ')' }],
    };
  }
  const closing = closingOf(text, innermost);
  return {
    detail: `The bracket ${openText(situation, innermost)} is still open ${where}.`,
    expected: [{ text: `\`${closing}\` to close it`, insert: closing }, ...(inModulus ? [operation] : [])],
    open: { start: innermost.start, end: situation.offset },
  };
}
