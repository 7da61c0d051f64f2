import type { Metadata } from 'next';
import Link from 'next/link';
import { headers } from 'next/headers';
import { waitWords } from '@/lib/contracts/wait';
import { addressOf } from '@/lib/http/incoming';
import { openReset } from '@/lib/people/open-reset';
import { shortestPassword } from '@/lib/people/password-length';
import { ActionForm } from '../../_components/form/action-form';
import { Field } from '../../_components/form/field';
import { SendButton } from '../../_components/form/send-button';
import { Door } from '../../_components/people/door';
import { Colophon } from '../../_components/shell/colophon';
import { Row } from '../../_components/shell/row';
import { choosePassword } from '../actions';

export const metadata: Metadata = { title: 'Set a new password', robots: { index: false } };

const whyNot = {
  expired: 'The link has run out. Ask for a new one; it is good for an hour.',
  used: 'The link was used, or a newer one was sent in its place. Look for the newest mail, or ask for another link.',
  unknown: 'The link may have been cut short: open it again from the mail, whole. Or ask for another one.',
};

/** Where the link for a new password leads. Opening it uses nothing up. */
export default async function SetPasswordPage({ params }: { params: Promise<{ token: string }> }) {
  const { token } = await params;
  const reset = await openReset(token, addressOf(await headers()));
  return (
    <>
      {reset.state === 'open' ? (
        <Door title="Set a new password">
          <ActionForm action={choosePassword}>
            <input type="hidden" name="token" value={token} />
            <div className="two">
              <Field
                label="E-mail address"
                name="email"
                type="email"
                readOnly
                value={reset.email}
                autoComplete="username"
              />
              <Field
                label="New password"
                name="password"
                type="password"
                autoComplete="new-password"
                hint={`At least ${shortestPassword} characters; a few words in a row are good.`}
              />
            </div>
            <div className="form-acts">
              <SendButton>Set the password</SendButton>
            </div>
          </ActionForm>
        </Door>
      ) : reset.state === 'too-often' ? (
        <Door title="Too many links were tried" lead={waitWords(reset.seconds)} />
      ) : (
        <Door title="This link sets no password" lead={whyNot[reset.state]}>
          <p className="form-acts">
            <Link className="btn primary" href="/reset">
              Ask for a new link
            </Link>
          </p>
        </Door>
      )}
      <main className="sheet low" id="sheet" tabIndex={-1}>
        <Row side="what it does" id="does" className="">
          <p className="lead">
            A new password signs you out on every device but this one. Tokens of scripts keep working; they are listed
            on your account.
          </p>
        </Row>
      </main>
      <Colophon />
    </>
  );
}
