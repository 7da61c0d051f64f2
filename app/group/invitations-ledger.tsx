import type { WaitingInvitation } from '@/lib/people/invitations';
import { ActionForm } from '../_components/form/action-form';
import { SendButton } from '../_components/form/send-button';
import { Ledger } from '../_components/ledger/ledger';
import { longDay } from '../_components/register/telling';
import { changeInvitation } from './actions';

interface Props {
  slug: string;
  invitations: readonly WaitingInvitation[];
}

/** Who was invited and has not come yet. */
export function InvitationsLedger({ slug, invitations }: Props) {
  const head = ['address', 'role', 'invited by', 'good until', <span key="acts">change</span>];
  return (
    <ActionForm action={changeInvitation} label="Invitations">
      <input type="hidden" name="group" value={slug} />
      {invitations.length === 0 ? (
        <p className="text">Nobody is being waited for.</p>
      ) : (
        <Ledger caption="Invitations that wait to be accepted" head={head} narrow="stack">
          {invitations.map(({ id, email, role, invitedBy, expiresAt, expired }) => (
            <tr key={id}>
              <th scope="row" className="named font-sans text-ui">
                {email}
              </th>
              <td>{role}</td>
              <td data-label="invited by" className="named">
                {invitedBy ?? 'someone who has left'}
              </td>
              <td data-label="good until">
                {longDay(expiresAt.toISOString())}
                {expired && ', run out'}
              </td>
              <td>
                <span className="acts">
                  <SendButton kind="plain" name="renew" value={id} label={`Send again to ${email}`}>
                    Send again
                  </SendButton>
                  <SendButton kind="plain" name="revoke" value={id} label={`Take back the invitation of ${email}`}>
                    Take back
                  </SendButton>
                </span>
              </td>
            </tr>
          ))}
        </Ledger>
      )}
    </ActionForm>
  );
}
