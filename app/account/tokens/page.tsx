import type { Metadata } from 'next';
import Link from 'next/link';
import { requireMember } from '@/lib/people/current';
import { may } from '@/lib/permissions';
import { listTokens } from '@/lib/tokens/list';
import { scopeWords, scopesOf } from '@/lib/tokens/scopes';
import { longestLife, longestTokenName } from '@/lib/tokens/limits';
import { Colophon } from '../../_components/shell/colophon';
import { Row } from '../../_components/shell/row';
import { NewToken } from '../../_components/tokens/new-token';
import { NoTokens } from '../../_components/tokens/no-tokens';
import { OlderTokens } from '../../_components/tokens/older-tokens';
import { TokenLedger } from '../../_components/tokens/token-ledger';

type Asked = { searchParams: Promise<Readonly<Record<string, string | string[] | undefined>>> };

export const metadata: Metadata = { title: 'Tokens' };

/** Tokens by which scripts act for the member who is signed in: make one, see what they do, end one. */
export default async function Tokens({ searchParams }: Asked) {
  const member = await requireMember('account', '/account/tokens');
  const { after } = await searchParams;
  const from = typeof after === 'string' ? after : undefined;
  const { tokens, older } = await listTokens(member, 'own', from);
  const offered = scopesOf(member.group.role).map((scope) => ({
    scope,
    says: scopeWords[scope],
    chosen: scope !== 'write',
  }));
  return (
    <>
      <section className="slab" aria-label="A new token">
        <div className="row">
          <p className="side to-title">tokens</p>
          <div>
            <h1 className="text-title">Tokens for scripts</h1>
            <p className="text mt-1 mb-5 max-w-[44em]">
              A script that sends one of them acts for you in {member.group.name}, within what your role allows.
            </p>
            <NewToken
              group={member.group.slug}
              scopes={offered}
              longestName={longestTokenName}
              longestLife={longestLife}
            />
          </div>
        </div>
      </section>
      <main className="sheet spread" id="sheet" tabIndex={-1}>
        <Row side="yours" sideClass="to-table" id="yours" className="">
          {tokens.length === 0 ? (
            <NoTokens />
          ) : (
            <TokenLedger tokens={tokens} group={member.group.slug} caption={`Your tokens in ${member.group.name}`} />
          )}
          <OlderTokens path="/account/tokens" older={older} first={from === undefined} />
        </Row>
        <aside className="notes from-top" aria-label="About tokens">
          <div>
            <h2>how to send one</h2>
            <p>
              In the header <code>Authorization: Bearer qdl_…</code> of every call.{' '}
              <Link href="/help#tokens">An example, and what each scope opens</Link>
            </p>
          </div>
          {may(member, 'members-manage') && (
            <div>
              <h2>as a steward</h2>
              <p>
                <Link href="/group/tokens">Tokens of the whole group</Link>
              </p>
            </div>
          )}
        </aside>
      </main>
      <Colophon>
        <span>Of a token only a digest is kept: nobody can show it again.</span>
        <span>Days and times are in UTC.</span>
      </Colophon>
    </>
  );
}
