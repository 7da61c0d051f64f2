import type { Metadata } from 'next';
import Link from 'next/link';
import { currentCaller, requirePerson } from '@/lib/people/current';
import { shortestPassword } from '@/lib/people/password-length';
import { seatsOf } from '@/lib/people/seats';
import { ActionForm } from '../_components/form/action-form';
import { Field } from '../_components/form/field';
import { SendButton } from '../_components/form/send-button';
import { Colophon } from '../_components/shell/colophon';
import { Row } from '../_components/shell/row';
import { Slip } from '../_components/slip/slip';
import { saveName, savePassword, signOut, signOutEverywhere } from './actions';
import { Groups } from './groups';

export const metadata: Metadata = { title: 'Account' };

interface Props {
  searchParams: Promise<Readonly<Record<string, string | string[] | undefined>>>;
}

const said: Readonly<Record<string, string>> = {
  password: 'Your password is set. Every other device is signed out.',
  left: 'You have left the group.',
};

export default async function AccountPage({ searchParams }: Props) {
  const person = await requirePerson('/account');
  const [caller, seats, asked] = await Promise.all([currentCaller(), seatsOf(person.id), searchParams]);
  const current = caller.kind === 'member' ? caller.group.id : undefined;
  const message = typeof asked.said === 'string' && Object.hasOwn(said, asked.said) ? said[asked.said] : undefined;
  return (
    <>
      <section className="slab" aria-label="Who you are">
        <div className="row">
          <p className="side to-title">account</p>
          <div className="named">
            <h1 className="text-title">{person.name}</h1>
            <p className="text">{person.email}</p>
          </div>
        </div>
      </section>
      <main className="sheet" id="sheet" tabIndex={-1}>
        {message !== undefined && (
          <div className="row form-slip">
            <span />
            <Slip kind="good">{message}</Slip>
          </div>
        )}
        <Row side="groups" id="groups" className="" sideClass="to-table">
          <Groups seats={seats} current={current} />
        </Row>
        <Row side="name" id="name" className="sec ruled">
          <ActionForm action={saveName} className="door" label="Name">
            <div className="two">
              <Field
                label="Your name, as others see it"
                name="name"
                autoComplete="name"
                defaultValue={person.name}
                hint="What you did before stays written down under the earlier name."
              />
            </div>
            <div className="form-acts">
              <SendButton kind="outlined">Save the name</SendButton>
            </div>
          </ActionForm>
        </Row>
        <Row side="password" id="password" className="sec ruled">
          <ActionForm action={savePassword} className="door" label="Password" clears>
            <input type="email" name="email" autoComplete="username" value={person.email} readOnly hidden />
            <div className="two">
              <Field label="Your password now" name="current" type="password" autoComplete="current-password" />
              <Field
                label="New password"
                name="next"
                type="password"
                autoComplete="new-password"
                hint={`At least ${shortestPassword} characters. Every other device is signed out.`}
              />
            </div>
            <div className="form-acts">
              <SendButton kind="outlined">Change the password</SendButton>
            </div>
          </ActionForm>
        </Row>
        <Row side="scripts" id="scripts" className="sec ruled">
          <p className="text">
            A script comes with a token in place of a password. <Link href="/account/tokens">Your tokens</Link>
          </p>
        </Row>
        <Row side="sessions" id="sessions" className="sec ruled">
          <p className="text">
            Signing out everywhere ends every session, on this device and on all others. Tokens of scripts keep working.
          </p>
          <div className="form-acts">
            <ActionForm action={signOut} label="This device">
              <SendButton kind="outlined">Sign out</SendButton>
            </ActionForm>
            <ActionForm action={signOutEverywhere} label="Every device">
              <SendButton kind="outlined">Sign out everywhere</SendButton>
            </ActionForm>
          </div>
        </Row>
      </main>
      <Colophon />
    </>
  );
}
