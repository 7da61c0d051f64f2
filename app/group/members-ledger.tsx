'use client';

import { useRef, useState } from 'react';
import { Button } from '../_components/button/button';
import { Ledger } from '../_components/ledger/ledger';
import type { RoleName } from '../_components/people/role-words';
import { Slip } from '../_components/slip/slip';
import { RemoveLeaf } from './remove-leaf';
import { RoleLeaf } from './role-leaf';

export interface MemberLine {
  readonly id: string;
  readonly name: string;
  readonly email: string;
  readonly role: RoleName;
  /** Since when, as a day. */
  readonly since: string;
}

interface Props {
  slug: string;
  members: readonly MemberLine[];
  /** The id of the person who reads the page. */
  self: string;
  /** Whether that person gives roles and removes. */
  manages: boolean;
}

/** Who is in the group, and as what; for stewards with what they can change. */
export function MembersLedger({ slug, members, self, manages }: Props) {
  // The member as chosen: whoever is removed leaves the list before the leaf has said so.
  const [open, setOpen] = useState<{ readonly leaf: typeof RoleLeaf; readonly member: MemberLine }>();
  const [said, setSaid] = useState<string>();
  const place = useRef<HTMLDivElement>(null);
  const close = () => setOpen(undefined);
  const done = (words: string | undefined) => {
    close();
    setSaid(words);
    // The control that was used may be gone with its row.
    requestAnimationFrame(() => place.current?.focus());
  };
  const head = ['member', 'role', 'since', ...(manages ? [<span key="acts">change</span>] : [])];
  return (
    <div ref={place} tabIndex={-1} role="group" aria-label="Members">
      {said !== undefined && (
        <div className="form-slip">
          <Slip kind="good" onClose={() => setSaid(undefined)}>
            {said}
          </Slip>
        </div>
      )}
      <Ledger caption="Members of the group" head={head} narrow="stack">
        {members.map((member) => (
          <tr key={member.id}>
            <th scope="row" className="named">
              <span className="st">{member.name}</span>
              <span className="nm">{member.email}</span>
            </th>
            <td>{member.role}</td>
            <td data-label="since" className="whitespace-nowrap">
              {member.since}
            </td>
            {manages && (
              <td>
                <span className="acts">
                  <Button
                    kind="plain"
                    aria-haspopup="dialog"
                    aria-label={`Change the role of ${member.name}`}
                    onClick={() => setOpen({ leaf: RoleLeaf, member })}
                  >
                    Change role
                  </Button>
                  {member.id !== self && (
                    <Button
                      kind="plain"
                      aria-haspopup="dialog"
                      aria-label={`Remove ${member.name}`}
                      onClick={() => setOpen({ leaf: RemoveLeaf, member })}
                    >
                      Remove
                    </Button>
                  )}
                </span>
              </td>
            )}
          </tr>
        ))}
      </Ledger>
      {open !== undefined && <open.leaf slug={slug} member={open.member} onClose={close} onDone={done} />}
    </div>
  );
}
