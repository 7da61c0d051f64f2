import { z } from 'zod';
import { memberRoles } from '@/models/role';
import { scopes } from '@/models/scope';
import type { Contract } from './contract';

export const tokenAnswer = z.object({
  name: z.string().describe('The name its owner gave it.'),
  person: z.object({ name: z.string() }).describe('Who it acts for.'),
  group: z.object({ name: z.string(), slug: z.string().describe('The short name, with which keys begin.') }),
  role: z.enum(memberRoles).describe('The role that the person has in the group now.'),
  scopes: z.array(z.enum(scopes)).describe('What it may be used for, within what the role allows.'),
  expiresAt: z.iso.datetime().describe('A moment, in UTC.'),
});
export type TokenAnswer = z.infer<typeof tokenAnswer>;

export const tokenContract: Contract<undefined, typeof tokenAnswer> = {
  method: 'GET',
  path: '/api/v1/token',
  operation: 'token',
  summary: 'Whom the token acts for, and what it may do',
  description:
    'Says whom the token of this very request acts for, in which group and role, what its scopes are and when it expires. Any token may ask. A caller who is signed in without a token finds nothing here.',
  permission: 'token-state',
  request: undefined,
  answer: tokenAnswer,
  problems: ['unauthenticated', 'forbidden', 'not-found'],
  examples: [
    {
      name: 'night-run',
      summary: 'A token for a nightly script',
      answer: {
        name: 'night run',
        person: { name: 'Tobias Renk' },
        group: { name: 'Skerry seminar', slug: 'skerry' },
        role: 'author',
        scopes: ['read', 'compute'],
        expiresAt: '2027-01-31T08:00:00.000Z',
      },
    },
  ],
};
