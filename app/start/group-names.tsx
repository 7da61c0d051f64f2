'use client';

import { useState } from 'react';
import { longestSlug, slugOf } from '@/lib/contracts/slug';
import { Field } from '../_components/form/field';

/** The name of a group, and its short name, which follows the name until one writes another. */
export function GroupNames() {
  const [name, setName] = useState('');
  const [own, setOwn] = useState<string>();
  const slug = own ?? slugOf(name);
  return (
    <div className="two">
      <Field
        label="Name of the group"
        name="group"
        autoComplete="organization"
        value={name}
        onChange={(event) => setName(event.target.value)}
      />
      <Field
        label="Short name"
        name="slug"
        mono
        autoComplete="off"
        autoCapitalize="none"
        spellCheck={false}
        maxLength={longestSlug}
        value={slug}
        onChange={(event) => setOwn(event.target.value === '' ? undefined : event.target.value)}
        hint={
          slug === ''
            ? 'The keys of your identities begin with it. It cannot be changed later.'
            : `The keys of your identities begin with it: ${slug}-1, ${slug}-2. It cannot be changed later.`
        }
      />
    </div>
  );
}
