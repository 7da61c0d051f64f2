'use server';

import { draftKey } from '@/lib/contracts/identity-draft';
import { memberWho } from '@/lib/people/current';
import { dropDraft, keepDraft } from '@/lib/register/drafts';

/** Keeps what is being written; false where it cannot be kept, or by someone who keeps nothing here. */
export async function saveDraft(key: unknown, draft: unknown): Promise<boolean> {
  const member = await memberWho('identity-write');
  return member !== undefined && (await keepDraft(member.person.id, key, draft));
}

/** Forgets it. */
export async function forgetDraft(key: unknown): Promise<void> {
  const member = await memberWho('identity-write');
  const place = draftKey.safeParse(key);
  if (member !== undefined && place.success) await dropDraft(member.person.id, place.data);
}
