'use client';

import { Button } from '../_components/button/button';
import { ActionForm } from '../_components/form/action-form';
import { SendButton } from '../_components/form/send-button';
import { Leaf } from '../_components/leaf/leaf';
import { giveRole } from './actions';
import type { MemberLine } from './members-ledger';
import { RoleField } from './role-field';

export interface LeafProps {
  slug: string;
  member: MemberLine;
  onClose: () => void;
  onDone: (words: string | undefined) => void;
}

/** Gives a member another role. */
export function RoleLeaf({ slug, member, onClose, onDone }: LeafProps) {
  return (
    <Leaf open onClose={onClose} title={`The role of ${member.name}`}>
      <ActionForm action={giveRole} onDone={({ done }) => onDone(done)}>
        <input type="hidden" name="group" value={slug} />
        <input type="hidden" name="person" value={member.id} />
        <RoleField role={member.role} />
        <div className="btns">
          <SendButton>Give the role</SendButton>
          <Button onClick={onClose}>Leave it</Button>
        </div>
      </ActionForm>
    </Leaf>
  );
}
