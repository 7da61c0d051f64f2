import { post } from '../../harness/http';
import { newGroup, newMember, tokenOf } from '../../harness/people';
import type { TestGroup } from '../../harness/people';
import type { IdentityAnswer } from '@/lib/contracts/identity-answer';
import type { Member } from '@/lib/people/caller';

/** An identity that every test may keep. */
export const sample = {
  name: 'Square of a symbol',
  field: 'any',
  statement: '[a][a] = [-1][a]',
  hypotheses: ['a != 1'],
} as const;

/** A group with an author who holds a token of every scope. */
export interface Room {
  readonly group: TestGroup;
  readonly author: Member;
  readonly token: { readonly authorization: string };
}

export async function newRoom(): Promise<Room> {
  const group = await newGroup();
  const author = await newMember(group, 'author');
  return { group, author, token: await tokenOf(author) };
}

/** Keeps an identity over REST. */
export async function kept({ token }: Room, change: Readonly<Record<string, unknown>> = {}): Promise<IdentityAnswer> {
  const answer = await post('/api/v1/identities', { ...sample, ...change }, token);
  if (answer.status !== 201) throw new Error(`The sample was not kept: ${answer.status} ${answer.text}`);
  return answer.body as IdentityAnswer;
}
