import type { Typeset } from '@/lib/contracts/typeset';
import { placeTex } from '../bench/map-words';

/** What an identity says, in the parts in which it is kept. */
export interface Wording {
  readonly kind: 'equality' | 'residue';
  readonly statement: Typeset;
  readonly place?: Typeset;
  readonly uniformizer?: Typeset;
  readonly value?: Typeset;
  readonly warning: boolean;
}

/** The sign between the sides of a warning. Of a chain it is not known which step fails, so its signs stay. */
function unequal({ text, tex }: Typeset): Typeset {
  const signs = text.match(/=/g) ?? [];
  return signs.length === 1 ? { text: text.replace('=', '≠'), tex: tex.replace('=', '\\ne ') } : { text, tex };
}

/** A place that is a sum stands in parentheses below the sign. */
const below = (place: Typeset): string =>
  /[+\- ]/.test(place.text) && place.text !== 'infinity' ? `(${place.tex})` : placeTex(place.tex);

function residue({ statement, place, uniformizer, value, warning }: Wording): Typeset {
  const at = place ?? { text: '?', tex: '?' };
  const is = value ?? { text: '?', tex: '?' };
  const against = uniformizer === undefined ? '' : `^{${uniformizer.tex}}`;
  const sign = warning ? { text: '≠', tex: '\\ne' } : { text: '=', tex: '=' };
  return {
    text: `residue at ${at.text}${uniformizer === undefined ? '' : ` against ${uniformizer.text}`} of ${statement.text} ${sign.text} ${is.text}`,
    tex: `\\partial_{${below(at)}}${against}\\bigl(${statement.tex}\\bigr) ${sign.tex} ${is.tex}`,
  };
}

/** The whole saying, set: both sides with = or ≠ between them, or a residue and its value. */
export function sayingOf(wording: Wording): Typeset {
  if (wording.kind === 'residue') return residue(wording);
  return wording.warning ? unequal(wording.statement) : wording.statement;
}
