import { z } from 'zod';

/** A DOI pasted as an address, or with its name before it, is reduced to what begins with `10.`. */
function bareDoi(text: string): string {
  const bare = text.replace(/^(?:https?:\/\/)?(?:(?:dx|www)\.)?doi\.org\//i, '').replace(/^doi:\s*/i, '');
  return bare === text ? text : unescaped(bare);
}

/** An arXiv identifier pasted as an address, or with `arXiv:` before it, is reduced to the number. */
const bareArxiv = (text: string): string =>
  text
    .replace(/^(?:https?:\/\/)?(?:(?:www|export)\.)?arxiv\.org\/(?:abs|pdf|html)\//i, '')
    .replace(/^arxiv:\s*/i, '')
    .replace(/(?:\.pdf|\/)$/i, '');

function unescaped(text: string): string {
  try {
    return decodeURIComponent(text);
  } catch {
    return text;
  }
}

const isDoi = (text: string): boolean => /^10\.\d{4,9}(?:\.\d+)*\/[^\s\p{C}]{1,200}$/u.test(text);

/** Since April 2007 `yymm.number`, before that `archive/yymmnumber`; a version may follow. */
const isArxiv = (text: string): boolean =>
  /^\d{2}(?:0[1-9]|1[0-2])\.\d{4,5}(?:v[1-9]\d{0,2})?$/.test(text) ||
  /^[a-z]+(?:-[a-z]+)*(?:\.[A-Z]{2})?\/\d{2}(?:0[1-9]|1[0-2])\d{3}(?:v[1-9]\d{0,2})?$/.test(text);

export const doi = z
  .string()
  .max(500)
  .trim()
  .overwrite(bareDoi)
  .refine(isDoi, { error: 'This is no DOI: one begins with 10., a number and a slash, such as 10.1000/lemma-2.' })
  .describe('A DOI, such as `10.1000/lemma-2`; an address of doi.org is reduced to it.');

export const arxiv = z
  .string()
  .max(500)
  .trim()
  .overwrite(bareArxiv)
  .refine(isArxiv, { error: 'This is no arXiv identifier: write 2301.01234, 2301.01234v2 or math/0301234.' })
  .describe('An arXiv identifier, such as `2301.01234v2` or `math/0301234`; an address of arxiv.org is reduced to it.');
