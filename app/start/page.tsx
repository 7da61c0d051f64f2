import type { Metadata } from 'next';
import Link from 'next/link';
import { currentCaller } from '@/lib/people/current';
import { shortestPassword } from '@/lib/people/password-length';
import { ActionForm } from '../_components/form/action-form';
import { Field } from '../_components/form/field';
import { SendButton } from '../_components/form/send-button';
import { Door } from '../_components/people/door';
import { Colophon } from '../_components/shell/colophon';
import { Row } from '../_components/shell/row';
import { start } from './actions';
import { GroupNames } from './group-names';

export const metadata: Metadata = { title: 'Start a group' };

export default async function StartPage() {
  const { person } = await currentCaller();
  return (
    <>
      <Door title="Start a group" lead={person && `You will be its steward, ${person.name}.`}>
        <ActionForm action={start}>
          <GroupNames />
          {person === undefined && (
            <>
              <div className="two">
                <Field label="Your name" name="name" autoComplete="name" />
                <Field label="Your e-mail address" name="email" type="email" autoComplete="username" />
              </div>
              <div className="two">
                <Field
                  label="Password"
                  name="password"
                  type="password"
                  autoComplete="new-password"
                  hint={`At least ${shortestPassword} characters; a few words in a row are good.`}
                />
              </div>
            </>
          )}
          <div className="form-acts">
            <SendButton>Start the group</SendButton>
          </div>
        </ActionForm>
      </Door>
      <main className="sheet low" id="sheet" tabIndex={-1}>
        <Row side="what a group has" id="has" className="">
          <p className="lead">
            A register of the identities it trusts, with the reason for each. Its members are readers, authors,
            reviewers and stewards; you begin as its steward and invite the others by e-mail.
          </p>
        </Row>
        {person === undefined && (
          <Row side="here before" id="before" className="next">
            <p className="lead">
              With an account, <Link href="/sign-in?next=%2Fstart">sign in</Link> first. If a group has invited you,
              open the invitation in your mail instead.
            </p>
          </Row>
        )}
      </main>
      <Colophon />
    </>
  );
}
