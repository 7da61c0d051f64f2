import 'server-only';
import type { Reply } from '@/lib/compute/request';
import { declined } from '@/lib/compute/request';
import { problemOf } from '@/lib/contracts/problem';
import type { TokenAnswer } from '@/lib/contracts/token';
import type { Caller } from '@/lib/people/caller';

/** What the token of a caller is. A caller without one asks for something that is not there. */
export function describeToken(caller: Caller): Reply<TokenAnswer> {
  if (caller.kind === 'visitor' || caller.token === undefined)
    return declined(
      problemOf('not-found', 'You come with a session, and a session has no token. Send one to ask about it.'),
    );
  const { person, group, token } = caller;
  return {
    status: 200,
    answer: {
      name: token.name,
      person: { name: person.name },
      group: { name: group.name, slug: group.slug },
      role: group.role,
      scopes: [...token.scopes],
      expiresAt: token.expiresAt.toISOString(),
    },
  };
}
