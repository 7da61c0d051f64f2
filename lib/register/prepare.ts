import 'server-only';
import { Declined } from '@/lib/compute/declined';
import { declined, isAnswer, type Reply } from '@/lib/compute/request';
import type { RevisionContent } from '@/lib/contracts/identity-content';
import { checkWording } from './check';
import type { Written } from './store';
import { contradiction } from './verdict';
import { readWording } from './wording';

/** Reads and checks what is to be kept. What the engine contradicts is not kept. */
export async function prepare(content: RevisionContent, signal?: AbortSignal): Promise<Reply<Written>> {
  const read = reading(content);
  if (!isAnswer(read)) return read;
  // The texts as they were typed: a problem points into them.
  const checked = await checkWording(content, signal);
  if (!isAnswer(checked)) return checked;
  const { verdict, evidence } = checked.answer;
  const against = contradiction(verdict, content.warning, evidence.sentence);
  if (against !== undefined) return declined(against);
  const { wording, typeset } = read.answer;
  return { status: 200, answer: { content: { ...content, ...wording }, typeset, checked: checked.answer } };
}

function reading(content: RevisionContent): Reply<ReturnType<typeof readWording>> {
  try {
    return { status: 200, answer: readWording(content) };
  } catch (error) {
    if (error instanceof Declined) return declined(error.problem);
    throw error;
  }
}
