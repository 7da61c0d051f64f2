import { afterAll, beforeAll, expect, test } from 'vitest';
import { exportAnswer } from '@/lib/contracts/identities';
import { type ExportFormat, exportQuery } from '@/lib/contracts/identity-query';
import { closeDatabase } from '@/lib/database/connection';
import type { Member } from '@/lib/people/caller';
import { citation } from '@/lib/register/citation';
import { exportIdentities } from '@/lib/register/export';
import { withdrawIdentity } from '@/lib/register/withdraw';
import { ownDatabase } from '../harness/own-database';
import { newGroup, newMember, query } from '../harness/people';
import { answered, keep } from './register-samples';

const url = ownDatabase();
let author: Member;

beforeAll(async () => {
  process.env.DATABASE_URL = url();
  process.env.PUBLIC_URL = 'https://quadrel.skerry.example';
  author = await newMember(await newGroup(url()), 'author', { url: url() });
  await keep(author, { name: 'Square of a symbol', tags: ['one', 'two'] });
  await keep(author, {
    name: '=HYPERLINK("https://elsewhere.example"), 50% & more_of {it',
    field: 'Q',
    statement: '-[5][6] = -[-1][6]',
    hypotheses: [],
    reference: 'Costs $5 # 1 ~ x^2 \\end{document}',
    remark: '@cell\nsecond line',
  });
  const residue = { kind: 'residue', field: 'Q', statement: '[7][5]', hypotheses: [], place: '7', value: '[5]' };
  const { key } = await keep(author, { name: 'Residue at seven', ...residue });
  answered(await withdrawIdentity(author, key, { base: 1, reason: 'Said better elsewhere.' }));
});
afterAll(closeDatabase);

async function written(format: ExportFormat, filters: Record<string, string> = {}) {
  const file = answered(await exportIdentities(author, exportQuery.parse({ format, ...filters })));
  let text = '';
  for await (const chunk of file.chunks) text += chunk;
  return { ...file, text };
}

test('JSON has every identity, by number', async () => {
  const { text, type, name } = await written('json');
  expect({ type, name }).toEqual({ type: 'application/json', name: `${author.group.slug}-register.json` });
  const { identities } = exportAnswer.parse(JSON.parse(text));
  expect(identities.map(({ number, state }) => [number, state])).toEqual([
    [1, 'checked'],
    [2, 'checked'],
    [3, 'withdrawn'],
  ]);
  expect(JSON.parse((await written('json', { tag: 'two' })).text)).toMatchObject({ identities: [{ number: 1 }] });
  expect((await written('json', { words: 'nowhere' })).text).toBe('{"identities":[]}');
});

test('CSV has a row for each, and no cell that a spreadsheet would carry out', async () => {
  const { text } = await written('csv');
  const [head, ...rows] = text.split('\r\n');
  expect(head).toMatch(/^key,number,revision,state,visibility,kind,name,field,statement,hypotheses,/);
  expect(rows).toHaveLength(4);
  expect(text).toContain(`,"'=HYPERLINK(""https://elsewhere.example""), 50% & more_of {it",Q,'-[5][6] = -[-1][6],`);
  expect(text).toContain(`"'@cell\nsecond line"`);
});

test('TeX has a paragraph for each, with every sign of a text made harmless', async () => {
  const { text } = await written('tex');
  expect(text).toContain(
    `\\paragraph{Square of a symbol.} (${author.group.slug}-1) Over any field, with $a \\ne 1$:\n\\begin{equation*}\n  [a][a] = [-1][a]\n\\end{equation*}`,
  );
  expect(text).toContain('50\\% \\& more\\_of \\textbraceleft{}it');
  expect(text).toContain(
    'Costs \\$5 \\# 1 \\textasciitilde{} x\\textasciicircum{}2 \\textbackslash{}end\\textbraceleft{}document\\textbraceright{}',
  );
  expect(text).toContain('\\partial_{7}\\left([7][5]\\right) = [5]');
  expect(text).toContain('Withdrawn: Said better elsewhere.');
});

test('BibTeX has an entry for each, with braces that a counter of braces counts right', async () => {
  const { text } = await written('bibtex');
  expect(text.match(/^@misc\{/gm)).toHaveLength(3);
  expect([...text].filter((sign) => sign === '{')).toHaveLength([...text].filter((sign) => sign === '}').length);
});

test('a citation names keeper, group, revision, engine and address', async () => {
  const kept = await keep(author, { name: 'Cited' });
  const { slug } = author.group;
  expect(citation(kept, 'bibtex')).toBe(`@misc{${kept.key}-1,
  author = {Renk, Tobias},
  title  = {Cited},
  note   = {Skerry seminar, identity ${kept.number}, revision 1; checked with Quadrel ${kept.lastCheck?.engine}},
  url    = {https://quadrel.skerry.example/identities/${kept.key}/1}
}
`);
  expect(citation(kept, 'tex')).toContain(
    `\\bibitem{${kept.key}-1}\nTobias Renk, \\emph{Cited}. Skerry seminar, identity`,
  );
  const withdrawn = answered(await withdrawIdentity(author, `${slug}-${kept.number}`, { base: 1, reason: 'No.' }));
  expect(citation(withdrawn, 'bibtex')).toContain('; withdrawn}');
  for (const keeper of ['Euler', 'A and B', 'Renk, Tobias', '{x} y']) {
    const authorLine = citation({ ...kept, keeper }, 'bibtex').split('\n')[1];
    expect(authorLine).toMatch(/^ {2}author = \{\{.*\}\},$/);
  }
});

test('a register longer than one portion is written out whole', async () => {
  const member = await newMember(await newGroup(url()), 'author', { url: url() });
  await keep(member);
  await query(
    url(),
    `WITH first AS (SELECT * FROM identities WHERE group_id = $1),
     made AS (INSERT INTO identities (group_id, number, revision, state, visibility, keeper_name, name, kind, field, words)
       SELECT group_id, n, 1, 'draft', 'group', 'x', 'Lemma ' || n, kind, field, words FROM first, generate_series(2, 1100) n
       RETURNING id, name)
     INSERT INTO revisions (identity_id, number, name, kind, field, statement, author_name)
       SELECT id, 1, name, 'equality', 'any', '[a] = [a]', 'x' FROM made`,
    [member.group.id],
  );
  const file = answered(await exportIdentities(member, exportQuery.parse({ format: 'bibtex' })));
  const keys = new Set<string>();
  for await (const chunk of file.chunks) for (const [, key] of chunk.matchAll(/^@misc\{(.*),$/gm)) keys.add(key ?? '');
  expect(keys.size).toBe(1100);
});
