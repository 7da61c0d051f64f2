import type { Metadata } from 'next';
import Link from 'next/link';
import { requireMember } from '@/lib/people/current';
import { listTokens } from '@/lib/tokens/list';
import { Colophon } from '../../_components/shell/colophon';
import { Row } from '../../_components/shell/row';
import { OlderTokens } from '../../_components/tokens/older-tokens';
import { TokenLedger } from '../../_components/tokens/token-ledger';

type Asked = { searchParams: Promise<Readonly<Record<string, string | string[] | undefined>>> };

export const metadata: Metadata = { title: 'Tokens of the group' };

/** Every token of the group, for a steward: what acts for whom, and the way to end it. */
export default async function GroupTokens({ searchParams }: Asked) {
  const member = await requireMember('members-manage', '/group/tokens');
  const { after } = await searchParams;
  const from = typeof after === 'string' ? after : undefined;
  const { tokens, older } = await listTokens(member, 'group', from);
  return (
    <>
      <section className="slab" aria-label="About this page">
        <div className="row">
          <p className="side to-title">tokens</p>
          <div>
            <h1 className="text-title">Tokens of {member.group.name}</h1>
            <p className="text mt-1 max-w-[44em]">
              Each acts for one member, within what that member’s role allows. A steward can end any of them, and makes
              none for others. <Link href="/account/tokens">Your own</Link>
            </p>
          </div>
        </div>
      </section>
      <main className="sheet" id="sheet" tabIndex={-1}>
        <Row side="everyone’s" sideClass="to-table" id="everyones" className="">
          {tokens.length === 0 ? (
            <p className="lead">No member has made a token for this group yet.</p>
          ) : (
            <TokenLedger tokens={tokens} group={member.group.slug} caption={`Tokens of ${member.group.name}`} ofGroup />
          )}
          <OlderTokens path="/group/tokens" older={older} first={from === undefined} />
        </Row>
      </main>
      <Colophon>
        <span>Of a token only a digest is kept: nobody can show it again.</span>
        <span>Days and times are in UTC.</span>
      </Colophon>
    </>
  );
}
