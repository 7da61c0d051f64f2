import type { Metadata } from 'next';
import Link from 'next/link';
import { ActionForm } from '../_components/form/action-form';
import { Field } from '../_components/form/field';
import { SendButton } from '../_components/form/send-button';
import { Door } from '../_components/people/door';
import { Colophon } from '../_components/shell/colophon';
import { Row } from '../_components/shell/row';
import { askForLink } from './actions';

export const metadata: Metadata = { title: 'A link for a new password' };

export default function ResetPage() {
  return (
    <>
      <Door title="Have a link sent for a new password">
        <ActionForm action={askForLink}>
          <div className="two">
            <Field label="E-mail address of your account" name="email" type="email" autoComplete="username" />
          </div>
          <div className="form-acts">
            <SendButton>Send the link</SendButton>
            <Link href="/sign-in">Back to sign in</Link>
          </div>
        </ActionForm>
      </Door>
      <main className="sheet low" id="sheet" tabIndex={-1}>
        <Row side="if nothing comes" id="nothing" className="">
          <p className="lead">
            Look among unwanted mail, and whether this is the address you were invited at. Asking again sends a new
            link, and the one before stops working.
          </p>
        </Row>
      </main>
      <Colophon />
    </>
  );
}
