'use client';

import { useState } from 'react';
import { Choose } from '../_components/form/choose';
import { roleNames, roleWords, type RoleName } from '../_components/people/role-words';

/** The choice of a role; below it stands what the chosen one may do. */
export function RoleField({ role }: { role: RoleName }) {
  const [chosen, setChosen] = useState(role);
  return (
    <Choose
      label="Role"
      name="role"
      value={chosen}
      onChange={(event) => setChosen(roleNames.find((name) => name === event.target.value) ?? role)}
      options={roleNames.map((name) => ({ value: name, label: name }))}
      hint={`A member with this role ${roleWords[chosen]}.`}
    />
  );
}
