import { encode } from 'next-auth/jwt';
import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { closeDatabase } from '@/lib/database/connection';
import type { Member } from '@/lib/people/caller';
import { changePassword } from '@/lib/people/change-password';
import { endSessions } from '@/lib/people/end-sessions';
import { findReset, openReset } from '@/lib/people/open-reset';
import { hashPassword } from '@/lib/people/passwords';
import { isRefused } from '@/lib/people/refused';
import { removeMember } from '@/lib/people/remove-member';
import { requestReset } from '@/lib/people/request-reset';
import { hashSecret, newSecret } from '@/lib/people/secret-text';
import { callerOfCookies, groupCookie, sessionCookie } from '@/lib/people/session';
import { setPassword } from '@/lib/people/set-password';
import { checkPassword } from '@/lib/people/sign-in';
import { ownDatabase } from '../harness/own-database';
import { newGroup, newMember, query } from '../harness/people';

const url = ownDatabase();
const old = 'granite and lichen';
const fresh = 'basalt and heather';
let oldHash: string;
let member: Member;

beforeAll(async () => {
  process.env.DATABASE_URL = url();
  oldHash = await hashPassword(old);
});
beforeEach(async () => {
  member = await newMember(await newGroup(url()), 'author', { url: url(), passwordHash: oldHash });
});
afterAll(closeDatabase);

/** A session as the sign-in makes one. */
async function session(version: number): Promise<string> {
  const secret = process.env.NEXTAUTH_SECRET ?? '';
  return encode({ token: { sub: member.person.id, version }, secret, maxAge: 3600 });
}

const callerWith = (token: string, group?: string) =>
  callerOfCookies((name) => ({ [sessionCookie()]: token, [groupCookie()]: group })[name]);

/** What the mail job does to the newest request of the member. */
async function mailed(): Promise<string> {
  const token = newSecret();
  await query(
    url(),
    `UPDATE password_resets SET token_hash = $1
      WHERE id = (SELECT id FROM password_resets WHERE user_id = $2 AND used_at IS NULL ORDER BY created_at DESC LIMIT 1)`,
    [hashSecret(token), member.person.id],
  );
  return token;
}

const signIn = (password: string) => checkPassword(member.person.email, password, '192.0.2.1');

test('an address that no database can keep is the address of nobody', async () => {
  expect(await checkPassword('odile\0@skerry.example', old, '192.0.2.9')).toEqual({ outcome: 'wrong' });
});

describe('a session', () => {
  test('is that of the person, in the chosen group if it is one of theirs', async () => {
    const token = await session(1);
    const second = await newGroup(url(), 'A second group');
    await query(url(), "INSERT INTO memberships (group_id, user_id, role) VALUES ($1, $2, 'steward')", [
      second.id,
      member.person.id,
    ]);
    expect(await callerWith(token, second.slug)).toMatchObject({ group: { id: second.id, role: 'steward' } });
    expect(await callerWith(token, member.group.slug)).toMatchObject({
      group: { id: member.group.id, role: 'author' },
    });
    const foreign = await newGroup(url(), 'Not theirs');
    expect(await callerWith(token, foreign.slug)).toMatchObject({ group: { name: 'A second group' } });
  });

  test('signed with another secret, or made for another version, is nobody’s', async () => {
    const forged = await encode({
      token: { sub: member.person.id, version: 1 },
      secret: 'another secret of the same length as ours',
    });
    for (const token of [forged, await session(2), 'nonsense', ''])
      expect(await callerWith(token)).toEqual({ kind: 'visitor' });
  });

  test('ends when one signs out everywhere', async () => {
    const token = await session(1);
    expect(await callerWith(token)).toMatchObject({ kind: 'member' });
    expect(await endSessions(member.person.id)).toBe(2);
    expect(await callerWith(token)).toEqual({ kind: 'visitor' });
    expect(await callerWith(await session(2))).toMatchObject({ kind: 'member' });
  });

  test('two who sign out everywhere at once raise the version twice', async () => {
    const versions = await Promise.all([endSessions(member.person.id), endSessions(member.person.id)]);
    expect(versions.sort()).toEqual([2, 3]);
  });

  test('is in no group once the person is removed from it', async () => {
    const steward = await newMember(member.group, 'steward', { url: url() });
    const token = await session(1);
    await removeMember(steward, member.person.id);
    expect(await callerWith(token)).toMatchObject({ kind: 'visitor', person: { id: member.person.id } });
  });
});

describe('changing the password', () => {
  test('asks for the old one, ends every session and every link that was sent', async () => {
    await requestReset(member.person.email, '192.0.2.7');
    const link = await mailed();
    const token = await session(1);
    expect(await changePassword(member.person, { current: 'not this one', next: fresh })).toMatchObject({
      field: 'current',
    });
    expect(await callerWith(token)).toMatchObject({ kind: 'member' });
    expect(await changePassword(member.person, { current: old, next: fresh })).toEqual({ sessionVersion: 2 });
    expect(await callerWith(token)).toEqual({ kind: 'visitor' });
    expect(await findReset(link)).toEqual({ state: 'used' });
    expect(await signIn(old)).toEqual({ outcome: 'wrong' });
    expect(await signIn(fresh)).toMatchObject({ outcome: 'right', version: 2 });
  });

  test('twice at once is done once', async () => {
    const outcomes = await Promise.all(
      [fresh, 'another one of mine'].map((next) => changePassword(member.person, { current: old, next })),
    );
    expect(outcomes.filter((outcome) => !isRefused(outcome))).toHaveLength(1);
  });

  test('is not a way to go on guessing', async () => {
    for (let guess = 0; guess < 8; guess += 1)
      await changePassword(member.person, { current: `guess ${guess}`, next: fresh });
    expect(await changePassword(member.person, { current: old, next: fresh })).toMatchObject({
      refused: expect.stringMatching(/^Too many attempts/),
      field: 'current',
    });
    expect(await signIn(old)).toMatchObject({ outcome: 'too-often' });
  });
});

describe('a link for a new password', () => {
  test('is asked for with one answer for all, and mailed to an account only', async () => {
    expect(await requestReset(member.person.email, '192.0.2.2')).toEqual({ asked: true });
    expect(await requestReset('nobody@skerry.example', '192.0.2.2')).toEqual({ asked: true });
    const jobs = await query(
      url(),
      `SELECT r.user_id FROM graphile_worker._private_jobs j
         JOIN graphile_worker._private_tasks t ON t.id = j.task_id
         JOIN password_resets r ON r.id::text = j.payload->>'resetId'
        WHERE t.identifier = 'mail-password-reset' AND r.user_id = $1`,
      [member.person.id],
    );
    expect(jobs).toHaveLength(1);
    const [row] = await query<{ minutes: number }>(
      url(),
      'SELECT round(extract(epoch FROM expires_at - now()) / 60)::int AS minutes FROM password_resets WHERE user_id = $1',
      [member.person.id],
    );
    expect(row).toEqual({ minutes: 60 });
  });

  test('sets a password once, ends every session and lets in who was locked out by guesses', async () => {
    const token = await session(1);
    for (let guess = 0; guess < 9; guess += 1) await signIn(`guess ${guess}`);
    expect(await signIn(old)).toMatchObject({ outcome: 'too-often' });
    await requestReset(member.person.email, '192.0.2.3');
    const link = await mailed();
    expect(await openReset(link, '192.0.2.3')).toMatchObject({ state: 'open', email: member.person.email });
    expect(await setPassword(link, fresh)).toEqual({ userId: member.person.id, sessionVersion: 2 });
    expect(await callerWith(token)).toEqual({ kind: 'visitor' });
    expect(await signIn(fresh)).toMatchObject({ outcome: 'right', version: 2 });
    expect(await setPassword(link, 'a third password')).toMatchObject({ refused: expect.any(String) });
    expect(await openReset(link, '192.0.2.3')).toEqual({ state: 'used' });
  });

  test('used ten times at once sets one password', async () => {
    await requestReset(member.person.email, '192.0.2.4');
    const link = await mailed();
    const outcomes = await Promise.all(
      Array.from({ length: 10 }, (_, index) => setPassword(link, `${fresh} ${index}`)),
    );
    expect(outcomes.filter((outcome) => !isRefused(outcome))).toHaveLength(1);
  });

  test('stops working when a newer one is asked for, and after an hour', async () => {
    await requestReset(member.person.email, '192.0.2.5');
    const first = await mailed();
    await requestReset(member.person.email, '192.0.2.5');
    const second = await mailed();
    expect(await findReset(first)).toEqual({ state: 'used' });
    expect(await findReset(second)).toMatchObject({ state: 'open' });
    await query(url(), "UPDATE password_resets SET expires_at = now() - interval '1 second' WHERE token_hash = $1", [
      hashSecret(second),
    ]);
    expect(await openReset(second, '192.0.2.5')).toEqual({ state: 'expired' });
    expect(await setPassword(second, fresh)).toMatchObject({ refused: expect.stringContaining('no longer works') });
    expect(await openReset(newSecret(), '192.0.2.5')).toEqual({ state: 'unknown' });
  });

  test('is counted by account, whether or not there is one, and by address', async () => {
    for (const email of [member.person.email, 'nobody-else@skerry.example']) {
      for (let time = 0; time < 3; time += 1) await requestReset(email, '192.0.2.6');
      expect(await requestReset(email, '192.0.2.60')).toMatchObject({
        refused: expect.stringMatching(/^Too many attempts/),
      });
    }
  });
});
