import { describe, expect, test } from 'vitest';
import { errorsOf, openPage } from '../harness/browser';
import { get, send } from '../harness/http';
import { newAccount, sessionOf } from '../harness/sign-in';
import { eventually } from './bench-page';
import { keptBy, newKeeper, pageOf } from './register-page';

const nothing = 'There is nothing here that you can see.';

describe('who sees what', () => {
  test('a public identity is read without an account, and shows nothing that is for the group', async () => {
    const member = await newKeeper();
    const { key } = await keptBy(member, {
      name: 'For anyone',
      statement: '[2] = [2]',
      tags: ['two'],
      visibility: 'public',
    });
    const page = await openPage(`/identities/${key}`);
    expect(await page.getByRole('heading', { level: 1 }).innerText()).toBe('For anyone');
    expect(await page.locator('.deeds').innerText()).toContain('anyone with the link');
    for (const name of [/revise/i, /withdraw/i, /check again/i, /show to/i])
      expect(await page.getByRole('button', { name }).or(page.getByRole('link', { name })).count()).toBe(0);
    expect(await page.locator('.deeds a', { hasText: 'two' }).count()).toBe(0);
    expect((await get(`/identities/${key}/1`)).status).toBe(200);
    expect((await get(`/identities/${key}/2`)).status).toBe(404);
    const file = await get(`/identities/${key}/1/write-out?format=tex`);
    expect([file.status, file.headers.get('content-disposition')]).toEqual([
      200,
      `attachment; filename="${key}-1.tex"`,
    ]);
    expect(errorsOf(page)).toEqual([]);
  });

  test('a private one is not there for a visitor and for another group', async () => {
    const member = await newKeeper();
    const { key } = await keptBy(member, { name: 'For us', statement: '[2] = [2]' });
    const stranger = await sessionOf((await newKeeper('steward')).person.email);
    for (const path of [`/identities/${key}`, `/identities/${key}/1`, `/identities/${key}/1/write-out?format=json`])
      for (const headers of [{}, { cookie: stranger }] as Record<string, string>[]) {
        const answer = await get(path, headers);
        expect(answer.status, path).toBe(404);
        expect(answer.text).not.toContain('For us');
      }
    expect((await get(`/identities/${key}/revise`, { cookie: stranger })).status).toBe(404);
    const page = await openPage(`/identities/${key}`);
    expect(await page.getByRole('heading', { level: 1 }).innerText()).toBe(nothing);
  });

  test('an author shows an identity to anyone and takes it back', async () => {
    const member = await newKeeper();
    const { key } = await keptBy(member, { name: 'Now and then', statement: '[2] = [2]' });
    const page = await pageOf(member, `/identities/${key}`);
    await page.getByRole('button', { name: 'show to anyone' }).click();
    await eventually(() => page.getByText('Anyone who has the link can read it now.').count()).toBe(1);
    await eventually(async () => (await get(`/identities/${key}`)).status).toBe(200);
    await page.getByRole('button', { name: 'show to the group alone' }).click();
    await eventually(async () => (await get(`/identities/${key}`)).status).toBe(404);
  });

  test('a reader reads and is offered nothing else', async () => {
    const member = await newKeeper();
    const { key } = await keptBy(member, { name: 'To be read', statement: '[2] = [2]' });
    const reader = await newAccount(member.group, 'reader', 'Ines Calloway');
    const page = await pageOf(reader, `/identities/${key}`);
    expect(await page.getByRole('heading', { level: 1 }).innerText()).toBe('To be read');
    for (const name of [/revise/i, /withdraw/i, /check again/i, /show to/i])
      expect(await page.getByRole('button', { name }).or(page.getByRole('link', { name })).count()).toBe(0);
    const cookie = await sessionOf(reader.person.email);
    expect((await get('/register', { cookie })).status).toBe(200);
    expect((await get('/register/keep', { cookie })).status).toBe(404);
    expect((await get(`/identities/${key}/revise`, { cookie })).status).toBe(404);
    await page.goto('/bench?field=Q&statement=%5B2%5D+%3D+%5B2%5D');
    await eventually(() => page.locator('.verdict h2').innerText()).toBe('Equal');
    expect(await page.getByRole('button', { name: /^Keep/ }).count()).toBe(0);
  });

  test('visitors are sent to sign in, and come back to the same page', async () => {
    for (const path of ['/register?words=steinberg', '/register/keep?field=Q&statement=%5B2%5D+%3D+%5B2%5D']) {
      const answer = await send(path, { redirect: 'manual' });
      expect([307, 303]).toContain(answer.status);
      const target = new URL(answer.headers.get('location') ?? '', 'http://here');
      expect(target.pathname).toBe('/sign-in');
      const back = new URL(target.searchParams.get('next') ?? '', 'http://here');
      const asked = new URL(path, 'http://here');
      expect([back.pathname, [...back.searchParams]]).toEqual([asked.pathname, [...asked.searchParams]]);
    }
  });

  test('an empty register says what to do first', async () => {
    const member = await newKeeper();
    const page = await pageOf(member, '/register');
    expect(await page.locator('#sheet').innerText()).toContain('No identity is kept yet.');
    expect(await page.getByRole('link', { name: 'To the bench' }).getAttribute('href')).toBe('/bench');
  });

  test('an address that was mistyped still shows the register', async () => {
    const member = await newKeeper();
    await keptBy(member, { name: 'Still here', statement: '[2] = [2]' });
    const cookie = await sessionOf(member.person.email);
    for (const search of [
      'state=nowhere',
      'cursor=xyz',
      'field=%5B',
      'degree=two',
      'sort=colour',
      'tag=%3Cb%3E',
      'words=%00',
    ]) {
      const answer = await get(`/register?${search}`, { cookie });
      expect(answer.status, search).toBe(200);
      expect(answer.text, search).toContain('Still here');
    }
  });
});

describe('a text stays a text', () => {
  const bad = `<script>document.title='taken'</script><img src=x onerror=document.title='taken'> \\href{javascript:alert(1)}{x} $x$ 5% & "quoted" {}`;

  test('HTML and TeX in every field are shown as they were typed', async () => {
    const member = await newKeeper();
    const { key } = await keptBy(member, {
      name: bad.slice(0, 110),
      statement: '[2] = [2]',
      reference: bad,
      remark: bad,
      tags: ['plain'],
      visibility: 'public',
    });
    const page = await pageOf(member, `/identities/${key}`);
    expect(await page.getByRole('heading', { level: 1 }).innerText()).toBe(bad.slice(0, 110));
    expect(await page.locator('.note').innerText()).toBe(bad);
    expect(await page.locator('#reference').innerText()).toContain(bad);
    expect(await page.locator('#sheet img, #sheet script, #sheet a[href^="javascript"]').count()).toBe(0);
    expect(await page.title()).not.toBe('taken');
    // what is cited does nothing either: every sign that TeX would act on is escaped
    const cite = await page.locator('.cite').first().innerText();
    expect(cite).not.toMatch(/(?<!\\)[$%&]/);
    expect(cite).not.toContain('\\href');
    await page.getByRole('link', { name: 'Revise' }).click();
    await page.getByLabel('Name', { exact: true }).waitFor();
    expect(await page.getByLabel('What else to know about it').inputValue()).toBe(bad);
    await page.goto('/register');
    expect(await page.locator('.register .nm').innerText()).toContain(bad.slice(0, 110).trimEnd());
    await page.goto(`/register?words=${encodeURIComponent(bad.slice(0, 150))}`);
    expect(await page.getByLabel('Words in a name').inputValue()).toBe(bad.slice(0, 150).trimEnd());
    expect(await page.title()).not.toBe('taken');
    expect(errorsOf(page)).toEqual([]);
  });

  test('the actions of the pages ask for themselves who may do what', async () => {
    const member = await newKeeper();
    const { key } = await keptBy(member, { name: 'Kept safe', statement: '[2] = [2]' });
    const reader = await newAccount(member.group, 'reader', 'Ines Calloway');
    const page = await pageOf(member, `/identities/${key}`);
    const [request] = await Promise.all([
      page.waitForRequest((one) => one.headers()['next-action'] !== undefined),
      page.getByRole('button', { name: 'show to anyone' }).click(),
    ]);
    await eventually(() => page.getByText('Anyone who has the link can read it now.').count()).toBe(1);
    await page.getByRole('button', { name: 'show to the group alone' }).click();
    await eventually(async () => (await get(`/identities/${key}`)).status).toBe(404);
    const again = async (headers: Record<string, string>) =>
      send(`/identities/${key}`, {
        method: 'POST',
        headers: {
          'next-action': request.headers()['next-action'] ?? '',
          'content-type': 'text/plain;charset=UTF-8',
          ...headers,
        },
        body: request.postData() ?? '',
      });
    const cookie = await sessionOf(reader.person.email);
    const writer = await sessionOf(member.person.email);
    await again({ cookie });
    await again({});
    await again({ cookie: writer, origin: 'https://elsewhere.example' });
    expect((await get(`/identities/${key}`)).status).toBe(404);
    await again({ cookie: writer });
    expect((await get(`/identities/${key}`)).status).toBe(200);
  });
});
