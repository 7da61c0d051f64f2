'use client';

import Link from 'next/link';
import { type FormEvent, useState, useTransition } from 'react';
import { type DeedOutcome, withdraw } from '@/app/identities/actions';
import { Button } from '../../button/button';
import { Field } from '../../form/field';
import { Leaf } from '../../leaf/leaf';
import { reviseHref } from '../identity-address';

interface Props {
  readonly identityKey: string;
  readonly number: number;
  readonly revision: number;
  readonly withdrawn: boolean;
}

/** What an author does with an identity: revise it, or withdraw it with a reason. */
export function IdentityActions({ identityKey, number, revision, withdrawn }: Props) {
  const [asking, setAsking] = useState(false);
  return (
    <div className="btns">
      <Link className="btn" href={reviseHref(identityKey)}>
        {withdrawn ? 'Revise and bring it back' : 'Revise'}
      </Link>
      {!withdrawn && (
        <Button aria-haspopup="dialog" onClick={() => setAsking(true)}>
          Withdraw
        </Button>
      )}
      <Leaf open={asking} onClose={() => setAsking(false)} title={`Withdraw identity ${number}?`}>
        <WithdrawForm identityKey={identityKey} revision={revision} onLeave={() => setAsking(false)} />
      </Leaf>
    </div>
  );
}

function WithdrawForm({
  identityKey,
  revision,
  onLeave,
}: Pick<Props, 'identityKey' | 'revision'> & { readonly onLeave: () => void }) {
  const [reason, setReason] = useState('');
  const [wrong, setWrong] = useState<string>();
  const [sending, send] = useTransition();
  const onSubmit = (event: FormEvent) => {
    event.preventDefault();
    if (sending) return;
    if (reason.trim() === '') {
      setWrong('Say in a sentence why nobody should rely on it.');
      return;
    }
    send(async () => {
      const unanswered: DeedOutcome = { fault: 'The server did not answer. Send it again in a moment.' };
      const outcome = await withdraw(identityKey, revision, reason).catch(() => unanswered);
      if (outcome.fault === undefined) onLeave();
      else setWrong(outcome.fault);
    });
  };
  return (
    <form onSubmit={onSubmit} noValidate aria-busy={sending}>
      <p className="text">It stays in the register, struck, with your reason. Links to it keep working.</p>
      <div className="mt-4">
        <Field
          multiline
          rows={2}
          label="Why, in a sentence"
          name="reason"
          value={reason}
          error={wrong}
          maxLength={500}
          onChange={(event) => setReason(event.currentTarget.value)}
        />
      </div>
      <div className="btns">
        <Button type="submit" kind="primary">
          Withdraw
        </Button>
        <Button onClick={onLeave}>Leave it</Button>
      </div>
    </form>
  );
}
