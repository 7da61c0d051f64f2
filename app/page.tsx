import Link from 'next/link';
import { compute } from '@/lib/compute/pool';
import { isAnswer } from '@/lib/compute/request';
import type { CompareAnswer } from '@/lib/contracts/compare';
import { LiveAnswer, LiveBench, LiveSlab, LiveTry } from './_components/bench/live-line';
import { VerdictMark } from './_components/marks/verdict-mark';
import { Formula } from './_components/math/formula';
import { Colophon } from './_components/shell/colophon';
import { rooms } from './_components/shell/rooms';
import { Row } from './_components/shell/row';
import { whoIsHere } from './_components/shell/who-is-here';

const first = { field: 'Q', statement: '[5][6] = [-1][6]' };

const examples = [
  { field: 'Q', statement: '[6] = [2] + [3]' },
  { field: 'Q', statement: '<2> + <3> = <5> + <30>' },
];

let answered: Promise<CompareAnswer | undefined> | undefined;

/** The answer the page opens with, worked out once. Where it fails, the page asks for it like for any other. */
async function firstAnswer(): Promise<CompareAnswer | undefined> {
  const reply = await compute('compare', { ...first, forms: true }).catch(() => undefined);
  if (reply !== undefined && isAnswer(reply)) return reply.answer;
  answered = undefined;
  return undefined;
}

/** The question, a line to try it on, and a real answer; then contents as in a book. */
export default async function Landing() {
  answered ??= firstAnswer();
  const { group } = await whoIsHere();
  return (
    <LiveBench {...first} answer={await answered}>
      <section className="slab" aria-label="Try a statement">
        <div className="row landing-head">
          <span />
          <div className="opening">
            <h1>
              Two words in <Formula tex="[a]" /> and <Formula tex="\eta" />:<br />
              one class, or two?
            </h1>
            <p className="text">
              Quadrel reads the words of Milnor–Witt <span className="whitespace-nowrap">K-theory</span> as you type
              them in TeX, brings them to canonical form, and decides equality with evidence that a referee can recheck.
              The same engine answers scripts over REST.
            </p>
          </div>
        </div>
        <LiveSlab label="Type a statement; no account is needed" />
      </section>
      <main className="sheet spread" id="sheet" tabIndex={-1}>
        <LiveAnswer>
          <LiveTry examples={examples} />
        </LiveAnswer>
        <Row side="contents" sideClass="to-contents" id="contents">
          <nav className="contents" aria-label="Contents">
            {rooms.map((room) => (
              <Link key={room.href} href={room.href}>
                <b>{room.name}</b>
                <span>{room.says}</span>
              </Link>
            ))}
            <Link href="/help/api">
              <b>API</b>
              <span>every call of the REST interface, to read and to try</span>
            </Link>
          </nav>
        </Row>
        <aside className="notes from-top" aria-label="What is decided">
          <div className="deeds">
            <p>
              <Link className="btn primary wide" href="/bench">
                Open the bench
              </Link>
            </p>
          </div>
          <div>
            <h2>with an account</h2>
            <p>
              {group === undefined ? (
                <>
                  A group keeps what it has found in a register of its own. <Link href="/sign-in">Sign in</Link>, or{' '}
                  <Link href="/start">start a group</Link>.
                </>
              ) : (
                <>
                  What your group has found stands in <Link href="/register">the register of {group}</Link>.
                </>
              )}
            </p>
          </div>
          <div>
            <h2>what is decided</h2>
            <p>
              Everything over <Formula tex="\Q" />, <Formula tex="\R" />, <Formula tex="\C" />, <Formula tex="\Q_p" />,{' '}
              <Formula tex="\F_q" /> and <Formula tex="\F_q(t)" />, in every degree; over <Formula tex="\Q(t)" /> and
              number fields almost everything; and over every field at once, with letters: proved by relations, or
              refuted at values. <Link href="/help#fields">What is complete, and why</Link>
            </p>
          </div>
          <div>
            <h2>three verdicts</h2>
            <ul className="checks">
              <li>
                <VerdictMark of="equal" />
                <span>Equal</span>
              </li>
              <li>
                <VerdictMark of="different" />
                <span>Different</span>
              </li>
              <li>
                <VerdictMark of="undecided" />
                <span>Undecided</span>
              </li>
            </ul>
          </div>
        </aside>
      </main>
      <Colophon>
        <span>A verdict is a computation under stated hypotheses. It does not replace refereeing.</span>
        <Link href="/help">Help</Link>
        <Link href="/help/api">API</Link>
        <Link href="/help#conventions">Conventions</Link>
      </Colophon>
    </LiveBench>
  );
}
