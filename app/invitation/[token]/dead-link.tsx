import Link from 'next/link';
import { waitWords } from '@/lib/contracts/wait';
import type { DeadInvitation, TooOften } from '@/lib/people/open-invitation';
import { Door } from '../../_components/people/door';

const titles = {
  expired: 'This invitation has run out',
  used: 'This invitation was accepted',
  revoked: 'This invitation no longer holds',
  unknown: 'This link opens no invitation',
};

function whatToDo({ state, groupName }: DeadInvitation): string {
  const group = groupName === undefined ? 'the group' : `“${groupName}”`;
  switch (state) {
    case 'expired':
      return `An invitation is good for seven days. Ask a steward of ${group} to send a new one.`;
    case 'used':
      return `A link joins one person once. If it was you, sign in; if not, tell a steward of ${group}.`;
    case 'revoked':
      return `It was taken back, or a newer one was sent in its place. Look for the newest mail from ${group}, or ask one of its stewards.`;
    case 'unknown':
      return 'It may have been cut short: open it again from the mail, whole. A newer mail replaces an older one.';
  }
}

/** Why a link lets nobody in, and what can be done. */
export function DeadLink({ invitation }: { invitation: DeadInvitation | TooOften }) {
  if (invitation.state === 'too-often')
    return <Door title="Too many links were tried" lead={waitWords(invitation.seconds)} />;
  return (
    <Door title={titles[invitation.state]} lead={whatToDo(invitation)}>
      {invitation.state === 'used' && (
        <p className="form-acts">
          <Link className="btn primary" href="/sign-in">
            Sign in
          </Link>
        </p>
      )}
    </Door>
  );
}
