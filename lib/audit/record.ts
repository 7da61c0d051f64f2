import 'server-only';
import type { Transaction } from 'sequelize';
import { AuditEvent } from '@/models/audit-event';
import type { AuditAction } from './actions';

export interface Deed {
  readonly groupId: string;
  readonly actor: { readonly id: string; readonly name: string };
  readonly action: AuditAction;
  /** What it was done to, in words: an address, the key of an identity, the name of a token. */
  readonly subject: string;
  readonly detail?: Readonly<Record<string, string | number | boolean | null>>;
}

/** Writes down who did what, in the transaction in which it was done. */
export async function record(
  { groupId, actor, action, subject, detail }: Deed,
  transaction: Transaction,
): Promise<void> {
  await AuditEvent.create(
    { groupId, actorId: actor.id, actorName: actor.name, action, subject, detail: { ...detail } },
    { transaction },
  );
}
