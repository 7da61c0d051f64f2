import { shortestPassword } from '@/lib/people/password-length';
import { ActionForm } from '../../_components/form/action-form';
import { Field } from '../../_components/form/field';
import { SendButton } from '../../_components/form/send-button';
import { join, stepAside } from './actions';

interface Props {
  token: string;
  email: string;
  hasAccount: boolean;
  /** Who is signed in here. */
  person: { readonly name: string; readonly email: string } | undefined;
}

/** What it takes to accept: a name and a password, the password of the account, or nothing more. */
export function JoinForm({ token, email, hasAccount, person }: Props) {
  const hidden = <input type="hidden" name="token" value={token} />;
  if (person !== undefined && person.email !== email)
    return (
      <>
        <p className="text mt-4">
          You are signed in as {person.name}, with {person.email}. Only the account with {email} can accept this
          invitation.
        </p>
        <ActionForm action={stepAside}>
          {hidden}
          <div className="form-acts">
            <SendButton>Sign out and go on</SendButton>
          </div>
        </ActionForm>
      </>
    );
  if (person !== undefined)
    return (
      <ActionForm action={join}>
        {hidden}
        <div className="form-acts">
          <SendButton>Join the group</SendButton>
        </div>
      </ActionForm>
    );
  return (
    <ActionForm action={join}>
      {hidden}
      <div className="two">
        <Field label="E-mail address" name="email" type="email" readOnly value={email} autoComplete="username" />
        {!hasAccount && <Field label="Your name" name="name" autoComplete="name" />}
        {hasAccount ? (
          <Field
            label="Password of your account"
            name="password"
            type="password"
            autoComplete="current-password"
            hint="This address has an account here already."
          />
        ) : (
          <Field
            label="Choose a password"
            name="password"
            type="password"
            autoComplete="new-password"
            hint={`At least ${shortestPassword} characters; a few words in a row are good.`}
          />
        )}
      </div>
      <div className="form-acts">
        <SendButton>{hasAccount ? 'Sign in and join' : 'Join the group'}</SendButton>
      </div>
    </ActionForm>
  );
}
