import 'server-only';
import { isAnswer, type Reply } from '@/lib/compute/request';
import type { IdentitySummary } from '@/lib/contracts/identity-answer';
import type { ExportFormat, ExportQuery } from '@/lib/contracts/identity-query';
import { csvLine } from '@/lib/export/csv';
import type { SentFile } from '@/lib/http/sent-file';
import type { Member } from '@/lib/people/caller';
import { citation } from './citation';
import { type Conditions, conditionsOf } from './filter';
import { pageOf } from './list';
import { summaryOf } from './present';
import { identityTex } from './write-tex';

const portion = 500;

/** The whole register under the given filters as one file, by number, so that what changes meanwhile shifts nothing. */
export async function exportIdentities(
  member: Member,
  { format, state, ...filters }: ExportQuery,
): Promise<Reply<SentFile>> {
  const read = conditionsOf(member.group.id, filters);
  if (!isAnswer(read)) return read;
  const conditions = read.answer;
  if (state !== undefined) conditions.add(`i.state = ${conditions.bind(state)}`);
  const first = await portionAfter(conditions, undefined);
  const { type, ending, write } = formats[format];
  const name = `${member.group.slug}-register.${ending}`;
  return { status: 200, answer: { type, name, chunks: write(portions(conditions, first), member) } };
}

type Portions = AsyncIterable<readonly IdentitySummary[]>;

async function* portions(conditions: Conditions, first: readonly IdentitySummary[]): Portions {
  for (let rows = first; rows.length > 0; rows = await portionAfter(conditions, rows.at(-1)?.number)) {
    yield rows;
    if (rows.length < portion) return;
  }
}

async function portionAfter(conditions: Conditions, number: number | undefined): Promise<IdentitySummary[]> {
  const place = number === undefined ? undefined : { number };
  return (await pageOf(conditions, { sort: 'number', place, limit: portion })).map(summaryOf);
}

interface Format {
  readonly type: string;
  readonly ending: string;
  readonly write: (all: Portions, member: Member) => AsyncIterable<string>;
}

const formats: Readonly<Record<ExportFormat, Format>> = {
  json: { type: 'application/json', ending: 'json', write: writeJson },
  csv: { type: 'text/csv; charset=utf-8; header=present', ending: 'csv', write: writeCsv },
  tex: { type: 'application/x-tex; charset=utf-8', ending: 'tex', write: writeTex },
  bibtex: { type: 'application/x-bibtex; charset=utf-8', ending: 'bib', write: writeBibtex },
};

async function* writeJson(all: Portions): AsyncIterable<string> {
  let before = '{"identities":[';
  for await (const identities of all) {
    yield before + identities.map((identity) => JSON.stringify(identity)).join(',');
    before = ',';
  }
  yield before === ',' ? ']}' : '{"identities":[]}';
}

const columns: readonly (readonly [string, (identity: IdentitySummary) => string | number])[] = [
  ['key', ({ key }) => key],
  ['number', ({ number }) => number],
  ['revision', ({ revision }) => revision],
  ['state', ({ state }) => state],
  ['visibility', ({ visibility }) => visibility],
  ['kind', ({ kind }) => kind],
  ['name', ({ name }) => name],
  ['field', ({ field }) => field.text],
  ['statement', ({ statement }) => statement.text],
  ['hypotheses', ({ hypotheses }) => hypotheses.map(({ text }) => text).join(', ')],
  ['place', ({ place }) => place?.text ?? ''],
  ['uniformizer', ({ uniformizer }) => uniformizer?.text ?? ''],
  ['value', ({ value }) => value?.text ?? ''],
  ['warning', ({ warning }) => (warning ? 'yes' : 'no')],
  ['verdict', ({ lastCheck }) => lastCheck?.verdict ?? ''],
  ['engine', ({ lastCheck }) => lastCheck?.engine ?? ''],
  ['checked at', ({ lastCheck }) => lastCheck?.at ?? ''],
  ['reference', ({ reference }) => reference ?? ''],
  ['doi', ({ doi }) => doi ?? ''],
  ['arxiv', ({ arxiv }) => arxiv ?? ''],
  ['tags', ({ tags }) => tags.join(' ')],
  ['remark', ({ remark }) => remark ?? ''],
  ['kept by', ({ keeper }) => keeper],
  ['kept at', ({ createdAt }) => createdAt],
  ['changed at', ({ changedAt }) => changedAt],
  ['withdrawn because', ({ withdrawnReason }) => withdrawnReason ?? ''],
];

async function* writeCsv(all: Portions): AsyncIterable<string> {
  yield csvLine(columns.map(([title]) => title));
  for await (const identities of all)
    yield identities.map((identity) => csvLine(columns.map(([, cell]) => cell(identity)))).join('');
}

async function* writeTex(all: Portions, { group }: Member): AsyncIterable<string> {
  yield `% Register of ${group.name.replaceAll(/\s+/g, ' ')}. For a document with \\usepackage{amsmath,amssymb}.\n`;
  for await (const identities of all) yield identities.map((identity) => `\n${identityTex(identity)}`).join('');
}

async function* writeBibtex(all: Portions): AsyncIterable<string> {
  for await (const identities of all) yield identities.map((identity) => `${citation(identity, 'bibtex')}\n`).join('');
}
