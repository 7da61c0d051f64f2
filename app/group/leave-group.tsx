'use client';

import { useState } from 'react';
import { Button } from '../_components/button/button';
import { ActionForm } from '../_components/form/action-form';
import { SendButton } from '../_components/form/send-button';
import { Leaf } from '../_components/leaf/leaf';
import { leave } from './actions';

interface Props {
  slug: string;
  name: string;
  /** Whether the group would be without a steward. */
  isLastSteward: boolean;
}

/** The way out of the group. */
export function LeaveGroup({ slug, name, isLastSteward }: Props) {
  const [open, setOpen] = useState(false);
  const close = () => setOpen(false);
  return (
    <>
      <Button
        aria-haspopup="dialog"
        unavailable={isLastSteward ? 'You are the only steward. Make another member a steward first.' : undefined}
        onClick={() => setOpen(true)}
      >
        Leave the group
      </Button>
      <Leaf open={open} onClose={close} title={`Leave “${name}”?`}>
        <p className="text">
          You can come back only when a steward invites you again, and your tokens for this group stop working. What you
          kept stays in the register.
        </p>
        <ActionForm action={leave} label="Leave the group">
          <input type="hidden" name="group" value={slug} />
          <div className="btns">
            <SendButton>Leave the group</SendButton>
            <Button onClick={close}>Stay</Button>
          </div>
        </ActionForm>
      </Leaf>
    </>
  );
}
