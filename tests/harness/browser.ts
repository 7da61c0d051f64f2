import { AxeBuilder } from '@axe-core/playwright';
import { chromium } from 'playwright-core';
import type { Browser, BrowserContext, Page } from 'playwright-core';
import { afterAll, afterEach } from 'vitest';
import { serverUrl } from './http';

export interface Sight {
  readonly width?: number;
  readonly height?: number;
  readonly dark?: boolean;
  /** No motion, as a person may ask of the system. */
  readonly still?: boolean;
  /** A finger instead of a pointer. */
  readonly touch?: boolean;
}

const flags = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
];

let browser: Browser | undefined;
const open: BrowserContext[] = [];
const complaints = new WeakMap<Page, string[]>();

afterEach(async () => {
  await Promise.all(open.splice(0).map((context) => context.close()));
});

afterAll(async () => {
  await browser?.close();
  browser = undefined;
});

/** A context of its own (nothing kept from another test), closed when the test is over. */
export async function openContext(sight: Sight = {}): Promise<BrowserContext> {
  browser ??= await chromium.launch({ executablePath: process.env.CHROMIUM ?? '/usr/bin/chromium', args: flags });
  const context = await browser.newContext({
    baseURL: serverUrl(),
    viewport: { width: sight.width ?? 1280, height: sight.height ?? 860 },
    colorScheme: sight.dark === true ? 'dark' : 'light',
    reducedMotion: sight.still === false ? 'no-preference' : 'reduce',
    hasTouch: sight.touch ?? false,
    permissions: ['clipboard-read', 'clipboard-write'],
  });
  context.setDefaultTimeout(60_000);
  open.push(context);
  return context;
}

/** Collects what a page complains of: errors on its console, uncaught errors, breaches of its content policy. */
export function watch(page: Page): Page {
  const heard: string[] = [];
  complaints.set(page, heard);
  page.on('console', (message) => {
    if (message.type() === 'error') heard.push(message.text());
  });
  page.on('pageerror', (error) => heard.push(String(error)));
  return page;
}

/** Opens a path of the server under test in a context of its own. */
export async function openPage(path: string, sight: Sight = {}): Promise<Page> {
  const context = await openContext(sight);
  const page = watch(await context.newPage());
  await page.goto(path, { waitUntil: 'load' });
  return page;
}

/** What a page that `openPage` opened complained of so far. */
export const errorsOf = (page: Page): readonly string[] => complaints.get(page) ?? [];

/** What axe finds against WCAG 2.2 A and AA, one short text for each kind of finding and element. */
export async function findings(page: Page): Promise<string[]> {
  const tags = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'];
  const { violations } = await new AxeBuilder({ page }).withTags(tags).analyze();
  return violations.flatMap(({ id, help, nodes }) => nodes.map((node) => `${id}: ${help}: ${node.target.join(' ')}`));
}
