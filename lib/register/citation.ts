import 'server-only';
import { config } from '@/lib/config/config';
import type { IdentitySummary } from '@/lib/contracts/identity-answer';
import { texText } from './escape-tex';

/** The address of the page of a revision, for whoever cites it. */
const addressOf = ({ key, revision }: IdentitySummary): string =>
  `${config().PUBLIC_URL}/identities/${key}/${revision}`;

/** An identity to be cited, at the revision that is shown: an entry of BibTeX, or of a bibliography in TeX. */
export const citation = (identity: IdentitySummary, format: 'tex' | 'bibtex'): string =>
  format === 'bibtex' ? bibtex(identity) : bibitem(identity);

function bibtex(identity: IdentitySummary): string {
  const { key, revision, keeper, name } = identity;
  return [
    `@misc{${key}-${revision},`,
    `  author = {${authorOf(keeper)}},`,
    `  title  = {${texText(name)}},`,
    `  note   = {${noteOf(identity)}},`,
    `  url    = {${addressOf(identity)}}`,
    '}',
    '',
  ].join('\n');
}

const bibitem = (identity: IdentitySummary): string =>
  `\\bibitem{${identity.key}-${identity.revision}}\n` +
  `${texText(identity.keeper)}, \\emph{${texText(identity.name)}}. ${noteOf(identity)}. ` +
  `\\texttt{${texText(addressOf(identity))}}\n`;

function noteOf({ group, number, revision, lastCheck, state, warning }: IdentitySummary): string {
  const engine = lastCheck === undefined ? 'not checked' : `checked with Quadrel ${lastCheck.engine}`;
  const found = {
    draft: `${lastCheck === undefined ? 'not checked' : `draft, last looked at with Quadrel ${lastCheck.engine}`}`,
    checked: engine,
    withdrawn: 'withdrawn',
  }[state];
  return texText(
    `${group.name}, identity ${number}, revision ${revision}; ${warning ? 'a warning: the sides are different; ' : ''}${found}`,
  );
}

/** "Tobias Renk" as bibliographies sort it. A name of another kind stands in braces of its own and is taken whole. */
function authorOf(name: string): string {
  const parts = name.split(' ').filter((part) => part !== '');
  const family = parts.at(-1);
  if (
    family === undefined ||
    parts.length < 2 ||
    /[,{}\\]/.test(name) ||
    parts.some((part) => part.toLowerCase() === 'and')
  )
    return `{${texText(name)}}`;
  return `${texText(family)}, ${texText(parts.slice(0, -1).join(' '))}`;
}
