'use client';

import { Button } from '../_components/button/button';
import { ActionForm } from '../_components/form/action-form';
import { SendButton } from '../_components/form/send-button';
import { Leaf } from '../_components/leaf/leaf';
import { remove } from './actions';
import type { LeafProps } from './role-leaf';

/** Asks once more before a member is removed. */
export function RemoveLeaf({ slug, member, onClose, onDone }: LeafProps) {
  return (
    <Leaf open onClose={onClose} title={`Remove ${member.name}?`}>
      <p className="text">
        {member.name} can no longer open what belongs to this group, from this moment on, and the tokens made for it
        stop working. What {member.name} kept stays in the register.
      </p>
      <ActionForm action={remove} onDone={({ done }) => onDone(done)}>
        <input type="hidden" name="group" value={slug} />
        <input type="hidden" name="person" value={member.id} />
        <div className="btns">
          <SendButton>Remove</SendButton>
          <Button onClick={onClose}>Leave it</Button>
        </div>
      </ActionForm>
    </Leaf>
  );
}
