'use client';

import { useState } from 'react';
import { revokeTokenAction } from '../../account/tokens/actions';
import { Button } from '../button/button';
import { ActionForm } from '../form/action-form';
import { SendButton } from '../form/send-button';
import { Leaf } from '../leaf/leaf';

interface Props {
  /** Short name of the group it belongs to. */
  group: string;
  id: string;
  name: string;
  /** Whose it is, when it is not one's own. */
  owner?: string;
}

/** Asks once more, and ends a token for good. */
export function RevokeToken({ group, id, name, owner }: Props) {
  const [open, setOpen] = useState(false);
  const close = () => setOpen(false);
  return (
    <>
      <Button kind="plain" aria-haspopup="dialog" aria-label={`Revoke ${name}`} onClick={() => setOpen(true)}>
        Revoke
      </Button>
      <Leaf open={open} onClose={close} title={`Revoke “${name}”?`}>
        <p className="text">
          Whatever uses this token{owner !== undefined && <> of {owner}</>} is refused from now on. This cannot be taken
          back; a new token can be made at any time.
        </p>
        <ActionForm action={revokeTokenAction} label={`Revoke ${name}`} onDone={close}>
          <input type="hidden" name="group" value={group} />
          <input type="hidden" name="id" value={id} />
          <div className="btns">
            <SendButton>Revoke</SendButton>
            <Button onClick={close}>Leave it</Button>
          </div>
        </ActionForm>
      </Leaf>
    </>
  );
}
