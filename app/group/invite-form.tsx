import { ActionForm } from '../_components/form/action-form';
import { Field } from '../_components/form/field';
import { SendButton } from '../_components/form/send-button';
import { sendInvitation } from './actions';
import { RoleField } from './role-field';

/** Invites an address into the group. */
export function InviteForm({ slug }: { slug: string }) {
  return (
    <ActionForm action={sendInvitation} className="door" label="Invite a member" clears>
      <input type="hidden" name="group" value={slug} />
      <div className="two">
        <Field
          label="Invite by e-mail"
          name="email"
          type="email"
          autoComplete="off"
          hint="The link in the mail is good for seven days."
        />
        <RoleField role="author" />
      </div>
      <div className="form-acts">
        <SendButton>Send the invitation</SendButton>
      </div>
    </ActionForm>
  );
}
