import { z } from 'zod';
import { isSlug, longestSlug } from '@/lib/contracts/slug';
import { memberRoles } from '@/models/role';
import { longestPassword, shortestPassword } from './password-length';

/** Control characters, halves of surrogate pairs, line separators, and marks that turn the direction of the text around. */
const unprintable = /[\p{Cc}\p{Cs}\p{Zl}\p{Zp}\u202a-\u202e\u2066-\u2069]/u;

const longestName = 80;

const lengthOf = (text: string): number => [...text].length;

const name = (what: string) =>
  z
    .string({ error: `Write ${what}.` })
    .trim()
    .refine((text) => !unprintable.test(text), { error: 'This has characters that cannot be shown. Type it anew.' })
    .transform((text) => text.normalize('NFC').replace(/\s+/gu, ' '))
    .refine((text) => /[\p{L}\p{N}]/u.test(text), { error: `Write ${what}.` })
    .refine((text) => lengthOf(text) <= longestName, { error: `At most ${longestName} characters.` });

/** What people write into forms, checked and brought to one form; a server action can be called with anything. */
export const given = {
  personName: name('your name'),
  groupName: name('a name for the group'),
  email: z
    .string({ error: 'Write an e-mail address.' })
    .trim()
    .toLowerCase()
    .min(1, { error: 'Write an e-mail address.', abort: true })
    .max(254, { error: 'An e-mail address has at most 254 characters.', abort: true })
    .pipe(z.email({ error: 'An e-mail address looks like name@place.example.' })),
  newPassword: z
    .string({ error: 'Write a password.' })
    .refine((text) => lengthOf(text) >= shortestPassword, {
      error: `A password has at least ${shortestPassword} characters. A few words in a row are good.`,
    })
    .refine((text) => text.length <= longestPassword, {
      error: `A password has at most ${longestPassword} characters.`,
    }),
  password: z.string({ error: 'Write your password.' }).min(1, { error: 'Write your password.' }).max(10_000),
  slug: z
    .string({ error: 'Write a short name.' })
    .trim()
    .toLowerCase()
    .refine(isSlug, {
      error: `Use small letters, digits and hyphens, such as skerry: at most ${longestSlug}, a letter first, and a letter in every part.`,
    }),
  role: z.enum(memberRoles, { error: 'Choose a role.' }),
  id: z.uuid(),
  linkToken: z.string().regex(/^[\w-]{20,100}$/),
};
