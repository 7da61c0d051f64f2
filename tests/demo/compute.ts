import fs from 'node:fs';
import path from 'node:path';
import { isAnswer } from '@/lib/compute/request';
import { identityContent } from '@/lib/contracts/identity-content';
import { keyOf } from '@/lib/contracts/identity-key';
import { checkWording } from '@/lib/register/check';
import { weighedWords, type Written } from '@/lib/register/store';
import { stateOf } from '@/lib/register/verdict';
import { readWording } from '@/lib/register/wording';
import type { IdentityState } from '@/models/identity-words';

const folder = path.resolve(import.meta.dirname, '..', '..', 'seeders', 'demo');
const storyFile = path.join(folder, 'story.json');

/** Where the engine's part of the demo is recorded, for a seeder that runs before anything is compiled. */
export const recordedFile = path.join(folder, 'checked.json');

export interface StoryRevision {
  readonly at: string;
  readonly change?: string;
  readonly content: Readonly<Record<string, unknown>>;
}

export interface StoryIdentity {
  readonly keeper: string;
  readonly visibility: 'group' | 'public';
  readonly revisions: readonly StoryRevision[];
  readonly withdrawn?: { readonly at: string; readonly reason: string };
}

export interface Story {
  readonly group: { readonly name: string; readonly slug: string };
  readonly members: readonly { readonly name: string; readonly email: string; readonly role: string }[];
  readonly identities: readonly StoryIdentity[];
}

/** What the register computes of an identity: everything that is in its rows and not in the story. */
export interface Computed {
  readonly state: IdentityState;
  /** The words it is found by, for the four weights. */
  readonly words: readonly string[];
  readonly revisions: readonly Written[];
}

/** The invented groups, as they are written by hand. */
export const readStory = (): readonly Story[] => JSON.parse(fs.readFileSync(storyFile, 'utf8')) as Story[];

/** The demo as the register and the engine of this very program make it, by the key of each identity. */
export async function computeDemo(): Promise<Record<string, Computed>> {
  const computed: Record<string, Computed> = {};
  for (const { group, identities } of readStory())
    for (const [index, identity] of identities.entries()) {
      const key = keyOf(group.slug, index + 1);
      computed[key] = await computeIdentity(key, identity);
    }
  return computed;
}

async function computeIdentity(key: string, { keeper, revisions, withdrawn }: StoryIdentity): Promise<Computed> {
  const written: Written[] = [];
  for (const { content } of revisions) written.push(await computeRevision(content));
  const current = written.at(-1);
  if (current === undefined) throw new Error(`${key} has no revision.`);
  const { content, checked } = current;
  const state = withdrawn === undefined ? stateOf(checked.verdict, content.warning) : 'withdrawn';
  return { state, words: weighedWords({ ...content, key, keeper, state }), revisions: written };
}

async function computeRevision(given: Readonly<Record<string, unknown>>): Promise<Written> {
  const { visibility: _, ...content } = identityContent.parse(given);
  const { wording, typeset } = readWording(content);
  const checked = await checkWording(content);
  if (!isAnswer(checked)) throw new Error(`${content.name}: ${checked.problem.detail}`);
  return { content: { ...content, ...wording }, typeset, checked: checked.answer };
}
