import type { Metadata } from 'next';
import Link from 'next/link';
import { redirect } from 'next/navigation';
import { currentCaller } from '@/lib/people/current';
import { ownPath } from '@/lib/people/own-path';
import { Door } from '../_components/people/door';
import { Colophon } from '../_components/shell/colophon';
import { Row } from '../_components/shell/row';
import { Slip } from '../_components/slip/slip';
import { SignInForm } from './sign-in-form';

export const metadata: Metadata = { title: 'Sign in' };

interface Props {
  searchParams: Promise<Readonly<Record<string, string | string[] | undefined>>>;
}

/** What another page has to say to someone it sends here. */
const said: Readonly<Record<string, string>> = {
  out: 'You are signed out.',
  everywhere: 'You are signed out on every device.',
};

export default async function SignInPage({ searchParams }: Props) {
  const asked = await searchParams;
  const next = ownPath(asked.next) ?? '/register';
  const { person } = await currentCaller();
  if (person !== undefined) redirect(next);
  const message = typeof asked.said === 'string' && Object.hasOwn(said, asked.said) ? said[asked.said] : undefined;
  return (
    <>
      <Door title="Sign in to your group">
        {message !== undefined && (
          <div className="form-slip">
            <Slip>{message}</Slip>
          </div>
        )}
        <SignInForm next={next} />
      </Door>
      <main className="sheet low" id="sheet" tabIndex={-1}>
        <Row side="without an account" id="without" className="">
          <p className="lead">
            The bench is open to everyone, and so are identities that a group shows in public.{' '}
            <Link href="/bench">Go to the bench</Link>
          </p>
        </Row>
        <Row side="new here" id="new-here" className="next">
          <p className="lead">
            Open the invitation in your mail, or <Link href="/start">start a group</Link> of your own and invite the
            others.
          </p>
        </Row>
      </main>
      <Colophon>
        <span>Trouble signing in? Your steward can send a new invitation.</span>
      </Colophon>
    </>
  );
}
