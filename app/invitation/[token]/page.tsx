import type { Metadata } from 'next';
import Link from 'next/link';
import { headers } from 'next/headers';
import { addressOf } from '@/lib/http/incoming';
import { currentCaller } from '@/lib/people/current';
import { openInvitation } from '@/lib/people/open-invitation';
import { Door } from '../../_components/people/door';
import { roleWords } from '../../_components/people/role-words';
import { longDay } from '../../_components/register/telling';
import { Colophon } from '../../_components/shell/colophon';
import { Row } from '../../_components/shell/row';
import { DeadLink } from './dead-link';
import { JoinForm } from './join-form';

export const metadata: Metadata = { title: 'Invitation', robots: { index: false } };

/** Where the link of an invitation leads. Opening it uses nothing up: programs that check mail open links too. */
export default async function InvitationPage({ params }: { params: Promise<{ token: string }> }) {
  const { token } = await params;
  const invitation = await openInvitation(token, addressOf(await headers()));
  const { person } = await currentCaller();
  const open = invitation.state === 'open' ? invitation : undefined;
  return (
    <>
      {invitation.state !== 'open' && <DeadLink invitation={invitation} />}
      {open !== undefined && (
        <Door
          title={`Join “${open.groupName}”`}
          lead={`${open.invitedBy ?? 'A steward'} invites ${open.email} as ${open.role}. The invitation is good until ${longDay(open.expiresAt.toISOString()).replaceAll(' ', '\u00a0')}.`}
        >
          <JoinForm token={token} email={open.email} hasAccount={open.hasAccount} person={person} />
        </Door>
      )}
      <main className="sheet low" id="sheet" tabIndex={-1}>
        {open !== undefined && (
          <Row side={`as ${open.role}`} id="role" className="">
            <p className="lead">
              A member with this role {roleWords[open.role]}. A steward can change it at any time, and you can leave the
              group at any time.
            </p>
          </Row>
        )}
        <Row side="what this is" id="what" className={open === undefined ? '' : 'next'}>
          <p className="lead">
            Quadrel is the bench and the register of a research group for Milnor–Witt K-theory. The bench is open to
            everyone. <Link href="/bench">Go to the bench</Link>
          </p>
        </Row>
      </main>
      <Colophon />
    </>
  );
}
