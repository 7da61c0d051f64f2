import { beforeEach, describe, expect, test } from 'vitest';
import { errorsOf, findings, openPage } from '../harness/browser';
import { get, serverUrl } from '../harness/http';
import { newGroup } from '../harness/people';
import { forgetAttempts, newAccount, sessionOf, signInAs, testPassword } from '../harness/sign-in';
import { focusedName, overflow } from './people-page';

beforeEach(() => forgetAttempts('sign-in-address'));

const someone = async () => newAccount(await newGroup(), 'author');

describe.each(['/sign-in', '/start', '/reset'])('%s', (path) => {
  test.each([
    ['light', false, 1440],
    ['dark', true, 1440],
    ['light on a phone', false, 390],
    ['dark on a phone', true, 390],
  ])('has nothing for axe to find, %s, before and after an error', async (_name, dark, width) => {
    const page = await openPage(path, { dark, width, height: 844 });
    expect(await findings(page)).toEqual([]);
    await page.locator('.door button[type=submit]').click();
    await page.locator('[aria-invalid=true]').first().waitFor();
    expect(await findings(page)).toEqual([]);
    expect(await overflow(page)).toBe(0);
    expect(errorsOf(page)).toEqual([]);
  });

  test('does not move sideways from 320 to 1920 px', async () => {
    const page = await openPage(path);
    for (const width of [1920, 1199, 899, 719, 320]) {
      await page.setViewportSize({ width, height: 800 });
      expect.soft(await overflow(page), `${width} px`).toBe(0);
    }
  });
});

test('one signs in by keyboard alone, and comes to the register', async () => {
  const { person } = await someone();
  const page = await openPage('/sign-in');
  await page.getByRole('main').focus();
  await page.getByLabel('E-mail address').focus();
  await page.keyboard.type(person.email.toUpperCase());
  await page.keyboard.press('Tab');
  expect(await focusedName(page)).toBe('password');
  await page.keyboard.type(testPassword);
  await page.keyboard.press('Enter');
  await page.waitForURL('**/register');
  const head = page.getByRole('banner');
  expect(await head.getByRole('link', { name: person.name }).getAttribute('href')).toBe('/account');
  expect(await head.getByRole('link', { name: 'Skerry seminar' }).getAttribute('href')).toBe('/group');
});

test('a wrong password and an unknown address are told the same, at the field, and the address stays', async () => {
  const { person } = await someone();
  const page = await openPage('/sign-in');
  const told: (string | null)[] = [];
  for (const email of [person.email, 'nobody@skerry.example']) {
    await page.getByLabel('E-mail address').fill(email);
    await page.getByLabel('Password').fill('not the password');
    await page.getByRole('button', { name: 'Sign in' }).click();
    const field = page.getByLabel('Password');
    await expect.poll(() => field.inputValue()).toBe('');
    await page.locator('[name=password][aria-invalid=true]').waitFor();
    await expect.poll(() => focusedName(page)).toBe('password');
    const described = await field.getAttribute('aria-describedby');
    told.push(await page.locator(`[id="${described}"]`).textContent());
    expect(await page.getByLabel('E-mail address').inputValue()).toBe(email);
  }
  expect(told[0]).toContain('do not go together');
  expect(told[1]).toBe(told[0]);
});

test('an empty form says which field to write in, and asks the server nothing', async () => {
  const page = await openPage('/sign-in');
  await page.getByRole('button', { name: 'Sign in' }).click();
  await expect.poll(() => focusedName(page)).toBe('email');
  expect(errorsOf(page)).toEqual([]);
});

test('who guesses too often is told in how many seconds to come again, even with the right password', async () => {
  const { person } = await someone();
  for (let guess = 0; guess < 8; guess += 1)
    await expect(sessionOf(person.email, `guess ${guess}`)).rejects.toThrow('could not sign in');
  const page = await openPage('/sign-in');
  await page.getByLabel('E-mail address').fill(person.email);
  await page.getByLabel('Password').fill(testPassword);
  await page.getByRole('button', { name: 'Sign in' }).click();
  const alert = page.getByRole('alert').filter({ hasText: 'Too many attempts' });
  expect(await alert.textContent()).toMatch(/Try again in \d+ seconds/);
  expect(await page.getByLabel('E-mail address').inputValue()).toBe(person.email);
  await forgetAttempts('sign-in-account');
  await page.getByLabel('Password').fill(testPassword);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.waitForURL('**/register');
});

test('whoever is sent to the door comes back to the page', async () => {
  const { person } = await someone();
  const page = await openPage('/account');
  expect(new URL(page.url()).pathname + new URL(page.url()).search).toBe('/sign-in?next=%2Faccount');
  await page.getByLabel('E-mail address').fill(person.email);
  await page.getByLabel('Password').fill(testPassword);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.waitForURL('**/account');
  await page.goto('/sign-in?next=%2Fhelp');
  expect(new URL(page.url()).pathname).toBe('/help');
});

test.each(['//elsewhere.example/x', '/\\elsewhere.example/x', 'https://elsewhere.example/', '/\t/elsewhere.example'])(
  'the door leads nowhere else: next=%j',
  async (next) => {
    const { person } = await someone();
    const page = await openPage(`/sign-in?next=${encodeURIComponent(next)}`);
    await page.getByLabel('E-mail address').fill(person.email);
    await page.getByLabel('Password').fill(testPassword);
    await page.getByRole('button', { name: 'Sign in' }).click();
    await page.waitForURL('**/register');
    const again = await get(`/sign-in?next=${encodeURIComponent(next)}`, { cookie: await sessionOf(person.email) });
    expect(again.status).toBe(200);
    await page.goto(`/sign-in?next=${encodeURIComponent(next)}`);
    expect(new URL(page.url()).origin).toBe(serverUrl());
  },
);

test('pages whose address is a secret tell it to no other page', async () => {
  for (const path of ['/invitation/abcdefghijklmnopqrstuvwxyz', '/reset/abcdefghijklmnopqrstuvwxyz', '/reset'])
    expect((await get(path)).headers.get('referrer-policy'), path).toBe('no-referrer');
  expect((await get('/sign-in')).headers.get('referrer-policy')).toBe('strict-origin-when-cross-origin');
});

test('the session is a cookie that scripts of the page cannot read', async () => {
  const { person } = await someone();
  const page = await openPage('/sign-in');
  await signInAs(page, person.email);
  const cookie = (await page.context().cookies()).find(({ name }) => name === 'quadrel-session');
  expect(cookie).toMatchObject({ httpOnly: true, sameSite: 'Lax', path: '/' });
  expect(await page.evaluate(() => document.cookie)).not.toContain('quadrel-session');
  expect(await (await page.request.get('/api/auth/session')).text()).not.toContain(person.email);
});

test('on a phone the list of rooms has the group and the person, or the way in', async () => {
  const { person, group } = await someone();
  const page = await openPage('/help', { width: 390, height: 844 });
  const openRooms = async () => {
    await expect
      .poll(async () => {
        if ((await page.getByRole('dialog').count()) === 0) await page.getByRole('button', { name: 'Rooms' }).click();
        return page.getByRole('dialog', { name: 'Rooms' }).count();
      })
      .toBe(1);
    return page.getByRole('dialog', { name: 'Rooms' });
  };
  const door = (await openRooms()).getByRole('link', { name: 'Sign in' });
  expect(await door.getAttribute('href')).toBe('/sign-in?next=%2Fhelp');
  await signInAs(page, person.email);
  const rooms = await openRooms();
  expect(await rooms.getByRole('link', { name: group.name }).getAttribute('href')).toBe('/group');
  expect(await rooms.getByRole('link', { name: person.name }).getAttribute('aria-current')).toBe('page');
  expect(await findings(page)).toEqual([]);
});
