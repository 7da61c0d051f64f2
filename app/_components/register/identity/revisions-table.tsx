import Link from 'next/link';
import type { IdentityAnswer, RevisionAnswer } from '@/lib/contracts/identity-answer';
import { LongFormula } from '../../bench/sheet/long-formula';
import { VerdictMark } from '../../marks/verdict-mark';
import { checkMark, checkWord } from '../check-words';
import { differenceOf } from '../difference';
import { identityHref } from '../identity-address';
import { MarkedText } from '../marked-text';
import { sayingOf } from '../saying';
import { exactMoment, shortDay, shortName } from '../telling';
import { changedParts } from './changed-parts';

/** The statement as it was typed, its hypotheses behind it. */
const typed = ({ statement, hypotheses }: RevisionAnswer): string =>
  [statement.text, ...hypotheses.map(({ text }) => text)].join('; ');

/** What a revision changed: said, and in the statement marked, word by word. */
function Change({ revision, before }: { revision: RevisionAnswer; before: RevisionAnswer | undefined }) {
  if (!before) return revision.change === undefined ? null : <span className="nm">{revision.change}</span>;
  const parts = changedParts(before, revision);
  const restated = typed(before) !== typed(revision);
  const { before: was, after: now } = differenceOf(typed(before), typed(revision));
  return (
    <span className="nm">
      {revision.change !== undefined && <>{revision.change} </>}
      <span className="quiet">{parts}</span>
      {restated && (
        <>
          <span className="apart-text">
            <span className="sr">before: </span>
            <MarkedText pieces={was} />
          </span>
          <span className="apart-text">
            <span className="sr">now: </span>
            <MarkedText pieces={now} />
          </span>
        </>
      )}
    </span>
  );
}

/** All revisions, the newest first, each with what it changed. */
export function RevisionsTable({ identity }: { readonly identity: IdentityAnswer }) {
  const { revisions, revision: shown, key, current } = identity;
  return (
    <table className="ledger revs stack">
      <caption className="sr">Revisions, the newest first</caption>
      <thead>
        <tr>
          {['number', 'what it says', 'written', 'last check'].map((head) => (
            <th scope="col" key={head}>
              {head}
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {revisions.map((revision, index) => {
          const { number, author, at, lastCheck } = revision;
          const saying = sayingOf(revision);
          return (
            <tr key={number}>
              <td className="num">
                {number === shown ? (
                  <b aria-current="true">{number}</b>
                ) : (
                  <Link
                    href={number === current ? identityHref(key) : identityHref(key, number)}
                    aria-label={`Revision ${number}`}
                  >
                    {number}
                  </Link>
                )}
              </td>
              <td className="st">
                <LongFormula text={saying.text} tex={saying.tex} />
                <Change revision={revision} before={revisions[index + 1]} />
              </td>
              <td className="when">
                <time dateTime={at} title={exactMoment(at)}>
                  {shortDay(at)}
                </time>
                , {shortName(author)}
              </td>
              <td className="verdict-cell">
                {lastCheck ? (
                  <span className="with-glyph">
                    <VerdictMark of={checkMark[lastCheck.verdict]} />
                    {checkWord[lastCheck.verdict]}
                  </span>
                ) : (
                  <span className="quiet">not checked</span>
                )}
              </td>
            </tr>
          );
        })}
      </tbody>
    </table>
  );
}
