'use client';

import Link from 'next/link';
import { signIn } from 'next-auth/react';
import { waitWords } from '@/lib/contracts/wait';
import { ActionForm } from '../_components/form/action-form';
import { Field } from '../_components/form/field';
import type { FormState } from '../_components/form/form-state';
import { SendButton } from '../_components/form/send-button';

/** The same whether the address is unknown or the password is another one. */
const wrong =
  'This address and this password do not go together. Check both, or have a link sent to set a new password.';

async function enter(next: string, form: FormData): Promise<FormState> {
  const email = String(form.get('email') ?? '').trim();
  const password = String(form.get('password') ?? '');
  if (email === '') return { errors: { email: 'Write the e-mail address of your account.' } };
  if (password === '') return { errors: { password: 'Write your password.' } };
  const answer = await signIn('credentials', { redirect: false, email, password });
  const error = answer?.error ?? undefined;
  const seconds = /^wait-(\d+)$/.exec(error ?? '')?.[1];
  if (seconds !== undefined) return { fault: waitWords(Number(seconds)) };
  if (error === 'CredentialsSignin') return { errors: { password: wrong } };
  if (answer?.ok !== true) throw new Error('The sign-in was not answered.');
  // A whole new page, so that nothing of what a visitor saw is left.
  window.location.assign(next);
  return {};
}

/** Address and password; whoever comes in goes on to `next`, a path of this service. */
export function SignInForm({ next }: { next: string }) {
  return (
    <ActionForm action={(_before, form) => enter(next, form)}>
      <div className="two">
        <Field label="E-mail address" name="email" type="email" autoComplete="username" />
        <Field label="Password" name="password" type="password" autoComplete="current-password" />
      </div>
      <div className="form-acts">
        <SendButton>Sign in</SendButton>
        <Link href="/reset">Send me a link to set a new password</Link>
      </div>
    </ActionForm>
  );
}
