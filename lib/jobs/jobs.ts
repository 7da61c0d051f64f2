import 'server-only';
import { z } from 'zod';
import { mailInvitation } from './mail-invitation';
import { mailPasswordReset } from './mail-password-reset';

/** What a job does with a payload that was read. The signal is given when the worker has to end. */
type Work<Payload extends z.ZodType> = (payload: z.output<Payload>, signal: AbortSignal) => Promise<void>;

const job = <Payload extends z.ZodType>(payload: Payload, work: Work<Payload>) => ({
  payload,
  async perform(given: unknown, signal: AbortSignal): Promise<void> {
    const read = payload.safeParse(given);
    if (!read.success) throw new Error(`The payload of the job cannot be used: ${z.prettifyError(read.error)}`);
    await work(read.data, signal);
  },
});

/**
 * Every job by its name: what its payload is, and what is done with it. Payloads lie in the queue as they were put there, so
 * they hold ids and nothing secret. A job is done twice when a worker dies before it could say that it was done; that must do no
 * harm.
 */
export const jobs = {
  'mail-invitation': job(z.strictObject({ invitationId: z.uuid() }), mailInvitation),
  'mail-password-reset': job(z.strictObject({ resetId: z.uuid() }), mailPasswordReset),
};

export type JobName = keyof typeof jobs;
export type PayloadOf<Name extends JobName> = z.input<(typeof jobs)[Name]['payload']>;

/** Does one job. Throws when there is no such job, when its payload is not what it asks for, and when it fails. */
export async function perform(name: string, payload: unknown, signal: AbortSignal): Promise<void> {
  const found = Object.entries(jobs).find(([known]) => known === name);
  if (found === undefined) throw new Error(`There is no job "${name}". There are: ${Object.keys(jobs).join(', ')}.`);
  await found[1].perform(payload, signal);
}
