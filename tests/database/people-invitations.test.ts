import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { closeDatabase } from '@/lib/database/connection';
import { acceptAs, acceptAsNewcomer } from '@/lib/people/accept-invitation';
import type { Member } from '@/lib/people/caller';
import { waitingInvitations } from '@/lib/people/invitations';
import { invite } from '@/lib/people/invite';
import { findInvitation, openInvitation } from '@/lib/people/open-invitation';
import { isRefused } from '@/lib/people/refused';
import { revokeInvitation } from '@/lib/people/revoke-invitation';
import { seatsOf } from '@/lib/people/seats';
import { hashSecret, newSecret } from '@/lib/people/secret-text';
import type { MemberRole } from '@/models/role';
import { ownDatabase } from '../harness/own-database';
import { newGroup, newMember, query } from '../harness/people';

const url = ownDatabase();
let steward: Member;
let number = 0;

beforeAll(async () => {
  process.env.DATABASE_URL = url();
  steward = await newMember(await newGroup(url()), 'steward', { url: url(), name: 'Odile Farrant' });
});
afterAll(closeDatabase);

const someone = () => `invited-${(number += 1)}@skerry.example`;
const newcomer = { name: 'Ines Calloway', password: 'granite and lichen' };

async function invited(email: string, role: MemberRole = 'author'): Promise<string> {
  const sent = await invite(steward, { email, role });
  if (isRefused(sent)) throw new Error(sent.refused);
  return sent.invitationId;
}

/** What the mail job does: gives the invitation a token, of which the table has the hash. */
async function mailed(invitationId: string): Promise<string> {
  const token = newSecret();
  await query(url(), 'UPDATE invitations SET token_hash = $1 WHERE id = $2', [hashSecret(token), invitationId]);
  return token;
}

const members = () =>
  query(url(), 'SELECT user_id FROM memberships WHERE group_id = $1 ORDER BY 1', [steward.group.id]);

describe('inviting', () => {
  test('makes one mail, good for seven days, and is written down', async () => {
    const email = someone();
    const id = await invited(email, 'reviewer');
    const [row] = await query<{ days: number; hash: string | null }>(
      url(),
      `SELECT round(extract(epoch FROM expires_at - now()) / 86400)::int AS days, token_hash AS hash
         FROM invitations WHERE id = $1`,
      [id],
    );
    expect(row).toEqual({ days: 7, hash: null });
    const jobs = await query(
      url(),
      `SELECT 1 FROM graphile_worker._private_jobs j JOIN graphile_worker._private_tasks t ON t.id = j.task_id
        WHERE t.identifier = 'mail-invitation' AND j.payload->>'invitationId' = $1`,
      [id],
    );
    expect(jobs).toHaveLength(1);
    expect(await query(url(), `SELECT action, detail FROM audit_events WHERE subject = $1`, [email])).toEqual([
      { action: 'member-invited', detail: { role: 'reviewer' } },
    ]);
  });

  test('the same address again takes the earlier invitation back', async () => {
    const email = someone();
    const first = await mailed(await invited(email));
    const second = await mailed(await invited(email, 'reader'));
    expect(await findInvitation(first)).toMatchObject({ state: 'revoked' });
    expect(await findInvitation(second)).toMatchObject({ state: 'open', role: 'reader', email });
    const waiting = (await waitingInvitations(steward.group.id)).filter((one) => one.email === email);
    expect(waiting).toMatchObject([{ role: 'reader', invitedBy: 'Odile Farrant', expired: false }]);
  });

  test('an address twenty times at once leaves one open invitation', async () => {
    const email = someone();
    await Promise.all(Array.from({ length: 20 }, () => invited(email)));
    expect((await waitingInvitations(steward.group.id)).filter((one) => one.email === email)).toHaveLength(1);
    await query(url(), "DELETE FROM rate_limits WHERE key LIKE 'invite-group:%'");
  });

  test('a member is refused by name', async () => {
    const member = await newMember(steward.group, 'author', { url: url(), name: 'Tobias Renk' });
    expect(await invite(steward, { email: member.person.email, role: 'author' })).toEqual({
      refused: 'Tobias Renk is in this group already, as author.',
      field: 'email',
    });
  });

  test('is the stewards’ alone, also for one who was a steward when the page was read', async () => {
    for (const role of ['reader', 'author', 'reviewer'] as const) {
      const member = await newMember(steward.group, role, { url: url() });
      expect(await invite(member, { email: someone(), role: 'reader' })).toMatchObject({
        refused: expect.stringContaining('steward'),
      });
      const pretending: Member = { ...member, group: { ...member.group, role: 'steward' } };
      expect(await invite(pretending, { email: someone(), role: 'steward' })).toEqual({
        refused: 'You are no longer a steward of this group.',
      });
    }
  });

  test('is counted by group', async () => {
    const other = await newMember(await newGroup(url()), 'steward', { url: url() });
    let last;
    for (let index = 0; index < 61; index += 1)
      last = await invite(other, { email: other.person.email, role: 'reader' });
    expect(last).toMatchObject({ refused: expect.stringMatching(/^Too many attempts/) });
  });
});

describe('taking back', () => {
  test('ends the link; a second time, and for another group, there is nothing to take back', async () => {
    const id = await invited(someone());
    const token = await mailed(id);
    const stranger = await newMember(await newGroup(url()), 'steward', { url: url() });
    expect(await revokeInvitation(stranger, id)).toMatchObject({ refused: expect.stringContaining('no longer open') });
    expect(isRefused(await revokeInvitation(steward, id))).toBe(false);
    expect(await revokeInvitation(steward, id)).toMatchObject({ refused: expect.stringContaining('no longer open') });
    expect(await findInvitation(token)).toMatchObject({ state: 'revoked' });
    expect(await acceptAsNewcomer(token, newcomer)).toMatchObject({
      refused: expect.stringContaining('no longer open'),
    });
  });

  test('and accepting at once: one of the two is done', async () => {
    for (let round = 0; round < 5; round += 1) {
      const email = someone();
      const id = await invited(email);
      const token = await mailed(id);
      const [revoked, accepted] = await Promise.all([revokeInvitation(steward, id), acceptAsNewcomer(token, newcomer)]);
      expect([isRefused(revoked), isRefused(accepted)].sort()).toEqual([false, true]);
      const users = await query(url(), 'SELECT 1 FROM users WHERE email = $1', [email]);
      expect(users).toHaveLength(isRefused(accepted) ? 0 : 1);
    }
  });
});

describe('opening a link', () => {
  test('says what it invites to', async () => {
    const email = someone();
    const token = await mailed(await invited(email));
    expect(await openInvitation(token, '192.0.2.1')).toMatchObject({
      state: 'open',
      groupName: 'Skerry seminar',
      email,
      role: 'author',
      invitedBy: 'Odile Farrant',
      hasAccount: false,
    });
  });

  test('that has run out, was used, or is none says so', async () => {
    const old = await mailed(await invited(someone()));
    await query(url(), "UPDATE invitations SET expires_at = now() - interval '1 second' WHERE token_hash = $1", [
      hashSecret(old),
    ]);
    expect(await openInvitation(old, '192.0.2.1')).toMatchObject({ state: 'expired', groupName: 'Skerry seminar' });
    expect(await acceptAsNewcomer(old, newcomer)).toMatchObject({ refused: expect.any(String) });
    const used = await mailed(await invited(someone()));
    await acceptAsNewcomer(used, newcomer);
    expect(await openInvitation(used, '192.0.2.1')).toMatchObject({ state: 'used' });
    for (const token of [newSecret(), '', "' OR 1=1 --", hashSecret(old), 'x'.repeat(5000)])
      expect(await openInvitation(token, '192.0.2.1')).toEqual({ state: 'unknown' });
  });

  test('is counted by the address it is tried from, but only when it is none', async () => {
    const token = await mailed(await invited(someone()));
    for (let index = 0; index < 70; index += 1) await openInvitation(token, '192.0.2.50');
    expect(await openInvitation(token, '192.0.2.50')).toMatchObject({ state: 'open' });
    for (let index = 0; index < 60; index += 1) await openInvitation(newSecret(), '192.0.2.50');
    expect(await openInvitation(token, '192.0.2.50')).toMatchObject({
      state: 'too-often',
      seconds: expect.any(Number),
    });
    expect(await openInvitation(token, '192.0.2.51')).toMatchObject({ state: 'open' });
  });
});

describe('accepting', () => {
  test('makes an account with the invited address, seats it with the role, and is written down', async () => {
    const email = someone();
    const joined = await acceptAsNewcomer(await mailed(await invited(email, 'reviewer')), newcomer);
    if (isRefused(joined)) throw new Error(joined.refused);
    expect(await seatsOf(joined.userId)).toMatchObject([{ id: steward.group.id, role: 'reviewer' }]);
    expect(
      await query(url(), 'SELECT actor_name, action FROM audit_events WHERE subject = $1 AND actor_id = $2', [
        email,
        joined.userId,
      ]),
    ).toEqual([{ actor_name: 'Ines Calloway', action: 'member-joined' }]);
  });

  test('ten times at once gives one account and one membership', async () => {
    const email = someone();
    const token = await mailed(await invited(email));
    const outcomes = await Promise.all(Array.from({ length: 10 }, () => acceptAsNewcomer(token, newcomer)));
    expect(outcomes.filter((outcome) => !isRefused(outcome))).toHaveLength(1);
    expect(await query(url(), 'SELECT 1 FROM users WHERE email = $1', [email])).toHaveLength(1);
  });

  test('with an account, ten times at once, gives one membership', async () => {
    const known = await newMember(await newGroup(url()), 'author', { url: url() });
    const token = await mailed(await invited(known.person.email));
    const outcomes = await Promise.all(Array.from({ length: 10 }, () => acceptAs(token, known.person.id)));
    expect(outcomes.filter((outcome) => !isRefused(outcome))).toHaveLength(1);
    expect((await seatsOf(known.person.id)).filter(({ id }) => id === steward.group.id)).toHaveLength(1);
  });

  test('two accounts for one new address: by an invitation of two groups at once there is one', async () => {
    const email = someone();
    const other = await newMember(await newGroup(url()), 'steward', { url: url() });
    const sent = await invite(other, { email, role: 'reader' });
    if (isRefused(sent)) throw new Error(sent.refused);
    const tokens = [await mailed(await invited(email)), await mailed(sent.invitationId)];
    const outcomes = await Promise.all(tokens.map((token) => acceptAsNewcomer(token, newcomer)));
    expect(outcomes.filter((outcome) => !isRefused(outcome))).toHaveLength(1);
    expect(outcomes.find(isRefused)?.refused).toContain('There is an account with this address now');
    expect(await query(url(), 'SELECT 1 FROM users WHERE email = $1', [email])).toHaveLength(1);
  });

  test('is for the invited address alone', async () => {
    const stranger = await newMember(await newGroup(url()), 'author', { url: url() });
    const email = someone();
    const token = await mailed(await invited(email));
    const before = await members();
    expect(await acceptAs(token, stranger.person.id)).toEqual({
      refused: `This invitation is for ${email}. Only the account with that address can accept it.`,
    });
    expect(await members()).toEqual(before);
    expect(await findInvitation(token)).toMatchObject({ state: 'open' });
  });

  test('of an address that has an account makes no second one', async () => {
    const known = await newMember(await newGroup(url()), 'author', { url: url() });
    const token = await mailed(await invited(known.person.email));
    expect(await findInvitation(token)).toMatchObject({ hasAccount: true });
    expect(await acceptAsNewcomer(token, newcomer)).toMatchObject({ refused: expect.stringContaining('sign in') });
  });
});
