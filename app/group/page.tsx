import type { Metadata } from 'next';
import Link from 'next/link';
import { currentCaller, requireMember } from '@/lib/people/current';
import { waitingInvitations } from '@/lib/people/invitations';
import { membersOf } from '@/lib/people/members';
import { may } from '@/lib/permissions';
import { ActionForm } from '../_components/form/action-form';
import { Field } from '../_components/form/field';
import { SendButton } from '../_components/form/send-button';
import { countWithin, longDay } from '../_components/register/telling';
import { Colophon } from '../_components/shell/colophon';
import { Row } from '../_components/shell/row';
import { rename } from './actions';
import { InvitationsLedger } from './invitations-ledger';
import { InviteForm } from './invite-form';
import { LeaveGroup } from './leave-group';
import { MembersLedger } from './members-ledger';

export async function generateMetadata(): Promise<Metadata> {
  const caller = await currentCaller();
  return { title: caller.kind === 'member' ? caller.group.name : 'Group' };
}

/** The group: who is in it, and for stewards all they can change. */
export default async function GroupPage() {
  const member = await requireMember('members-read', '/group');
  const { person, group } = member;
  const manages = may(member, 'members-manage');
  const [members, invitations] = await Promise.all([
    membersOf(group.id),
    manages ? waitingInvitations(group.id) : Promise.resolve([]),
  ]);
  const stewards = members.filter(({ role }) => role === 'steward');
  const isLastSteward = stewards.length === 1 && stewards[0]?.id === person.id;
  return (
    <>
      <section className="slab" aria-label="The group">
        <div className="row">
          <p className="side to-title">group</p>
          <div className="named">
            <h1 className="text-title">{group.name}</h1>
            <p className="text">
              {members.length === 1
                ? `You are its only member so far, as ${group.role}.`
                : `You are one of ${countWithin(members.length)} members, as ${group.role}.`}{' '}
              Keys of its identities begin with {group.slug}: {group.slug}-1, {group.slug}-2.
            </p>
          </div>
        </div>
        {manages && (
          <div className="row">
            <span />
            <InviteForm slug={group.slug} />
          </div>
        )}
      </section>
      <main className="sheet" id="sheet" tabIndex={-1}>
        <Row side="members" id="members" className="" sideClass="to-table">
          <MembersLedger
            slug={group.slug}
            members={members.map(({ since, ...rest }) => ({ ...rest, since: longDay(since.toISOString()) }))}
            self={person.id}
            manages={manages}
          />
        </Row>
        {manages && (
          <>
            <Row side="invited" id="invited" className="sec ruled" sideClass="to-table">
              <InvitationsLedger slug={group.slug} invitations={invitations} />
            </Row>
            <Row side="name" id="name" className="sec ruled">
              <ActionForm action={rename} className="door" label="Name of the group">
                <input type="hidden" name="group" value={group.slug} />
                <div className="two">
                  <Field
                    label="Name of the group"
                    name="name"
                    autoComplete="organization"
                    defaultValue={group.name}
                    hint={`The short name ${group.slug} stays, because keys of identities begin with it.`}
                  />
                </div>
                <div className="form-acts">
                  <SendButton kind="outlined">Save the name</SendButton>
                </div>
              </ActionForm>
            </Row>
            <Row side="what happened" id="happened" className="sec ruled">
              <p className="text">
                Who invited, kept, revised, withdrew or made a token, and when, is written down.{' '}
                <Link href="/group/audit">Read what happened</Link>, or see the{' '}
                <Link href="/group/tokens">tokens of all members</Link>.
              </p>
            </Row>
          </>
        )}
        <Row side="leave" id="leave" className="sec ruled">
          <LeaveGroup slug={group.slug} name={group.name} isLastSteward={isLastSteward} />
        </Row>
      </main>
      <Colophon />
    </>
  );
}
