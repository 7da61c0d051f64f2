import Link from 'next/link';
import type { PermissionName } from '@/lib/contracts/permission-name';
import { permissionNames } from '@/lib/contracts/permission-name';
import { type Role, roles, ruleOf } from '@/lib/permissions';
import { Ledger } from '../../_components/ledger/ledger';
import { Row } from '../../_components/shell/row';

/** What each permission opens, in words; the rest of the table is read off the one that decides. */
const opens: Readonly<Record<PermissionName, string>> = {
  'service-state': 'ask whether the service is well, and for its description',
  compute: 'ask the engine: the bench, and computations over REST',
  'identity-open': 'read a public identity, by its address',
  'register-read': 'read the register of the group, and write it out',
  'identity-write': 'keep, revise, withdraw and check again, and choose who sees an identity',
  'token-state': 'ask a token whom it acts for',
  account: 'with an account: change name and password; make and revoke tokens of one’s own',
  'members-read': 'see who is in the group, and leave it',
  'members-manage': 'invite and remove members, change roles, rename the group, revoke any token',
  'audit-read': 'read what was done in the group, and write it out',
};

const roleWord = (role: Role): string => (role === 'visitor' ? 'anyone' : role);

const scopeWord = { any: 'any token', none: 'no token' } as const;

/** Roles and what each may, from the table that every page and call asks. */
export function Groups() {
  return (
    <Row side="groups and roles" id="groups" className="sec ruled">
      <div className="prose">
        <p>
          A group has members, and each member one role in it: {roles.slice(1).join(', ')}, every one with all that the
          one before it has. A person can be in several groups, in each with another role, and chooses on the page{' '}
          <Link href="/account">Account</Link> in which one to be. What belongs to another group does not exist for you.
        </p>
        <Ledger caption="Who may do what" head={['to', 'from this role on', 'or a script with']} narrow="stack">
          {permissionNames.map((permission) => {
            const { from, scope } = ruleOf(permission);
            return (
              <tr key={permission}>
                <td className="text">{opens[permission]}</td>
                <td data-label="from">{roleWord(from)}</td>
                <td data-label="with" className={scope === 'none' ? 'quiet' : 'whitespace-nowrap'}>
                  {scope === 'any' || scope === 'none' ? scopeWord[scope] : <>scope {<code>{scope}</code>}</>}
                </td>
              </tr>
            );
          })}
        </Ledger>
        <p>
          Who starts a group is its first steward and invites the others by mail; an invitation is good for seven days
          and for one person. A group always has a steward: the last one cannot leave, be removed or become less. A
          change of role, a removal and a new password act at once, on every device. What somebody kept stays in the
          register when they leave.
        </p>
      </div>
    </Row>
  );
}
