// An invented group with invented people and what they keep, so that every role can be tried. The texts are in demo/story.json; what
// the engine says of them is recorded in demo/checked.json by tests/demo/record.ts, and a test holds the two together.
import fs from 'node:fs';
import { hash } from '@node-rs/argon2';

/** Everyone of the demo signs in with it; README.md names it too. */
export const demoPassword = 'tiles on a stone table';

/** argon2id, as lib/people/passwords.ts has it. */
const hashing = { algorithm: 2, memoryCost: 19_456, timeCost: 2, parallelism: 1 };

const read = (name) => JSON.parse(fs.readFileSync(new URL(`demo/${name}`, import.meta.url), 'utf8'));

/** The search vector, as lib/register/store.ts makes it. */
const vector = (first) =>
  ['A', 'B', 'C', 'D']
    .map((weight, index) => `setweight(to_tsvector('simple', $${first + index}), '${weight}')`)
    .join(' || ');

export async function up({ context: { queryInterface, demo } }) {
  if (!demo) return;
  const { sequelize } = queryInterface;
  const [groups, checked] = [read('story.json'), read('checked.json')];
  await sequelize.transaction(async (transaction) => {
    const rows = async (sql, bind = []) => (await sequelize.query(sql, { bind, transaction }))[0];
    // Whoever signs up at this moment waits, so that the demo never stands beside people who are there.
    await rows('LOCK TABLE users IN SHARE ROW EXCLUSIVE MODE');
    const [{ someone }] = await rows('SELECT EXISTS (SELECT 1 FROM users) AS someone');
    if (someone) return;
    const people = new Map();
    for (const { members } of groups)
      for (const member of members)
        if (!people.has(member.name)) people.set(member.name, await insertPerson(rows, member));
    for (const story of groups) await insertGroup(rows, story, people, checked);
  });
}

async function insertPerson(rows, { name, email, at }) {
  const password = await hash(demoPassword, hashing);
  const [{ id }] = await rows(
    'INSERT INTO users (email, name, password_hash, created_at) VALUES ($1, $2, $3, $4) RETURNING id',
    [email, name, password, at],
  );
  return id;
}

async function insertGroup(rows, { group, members, identities }, people, checked) {
  const [{ id }] = await rows(
    'INSERT INTO groups (name, slug, next_number, created_at) VALUES ($1, $2, $3, $4) RETURNING id',
    [group.name, group.slug, identities.length + 1, group.at],
  );
  const [steward] = members;
  const events = [{ at: group.at, who: steward.name, action: 'group-started', subject: group.name, detail: {} }];
  for (const { name, email, role, at } of members) {
    await rows('INSERT INTO memberships (group_id, user_id, role, created_at) VALUES ($1, $2, $3, $4)', [
      ...[id, people.get(name), role, at],
    ]);
    if (name === steward.name) continue;
    const invited = new Date(Date.parse(at) - 3_600_000).toISOString();
    events.push({ at: invited, who: steward.name, action: 'member-invited', subject: email, detail: { role } });
    events.push({ at, who: name, action: 'member-joined', subject: email, detail: { role } });
  }
  for (const [index, identity] of identities.entries()) {
    const key = `${group.slug}-${index + 1}`;
    const place = { groupId: id, number: index + 1, keeperId: people.get(identity.keeper) };
    await insertIdentity(rows, place, identity, checked[key]);
    events.push(...eventsOf(key, identity, checked[key]));
  }
  for (const { at, who, action, subject, detail } of events.sort((a, b) => Date.parse(a.at) - Date.parse(b.at)))
    await rows(
      `INSERT INTO audit_events (group_id, actor_id, actor_name, action, subject, detail, at)
       VALUES ($1, $2, $3, $4, $5, $6, $7)`,
      [id, people.get(who), who, action, subject, JSON.stringify(detail), at],
    );
}

async function insertIdentity(rows, { groupId, number, keeperId }, identity, { state, words, revisions }) {
  const { keeper, visibility, withdrawn } = identity;
  const current = revisions.at(-1);
  const times = identity.revisions.map(({ at }) => at);
  const [{ id }] = await rows(
    `INSERT INTO identities (group_id, number, revision, state, visibility, keeper_id, keeper_name, name, kind, field,
                             degrees, tags, verdict, withdrawn_reason, created_at, changed_at, words)
     VALUES ($1, $2, $3, $4, $5, $6, $7, $8, $9, $10, $11, $12, $13, $14, $15, $16, ${vector(17)}) RETURNING id`,
    [
      ...[groupId, number, revisions.length, state, visibility, keeperId, keeper],
      ...[current.content.name, current.content.kind, current.content.field],
      ...[current.checked.degrees, current.content.tags, current.checked.verdict],
      ...[withdrawn?.reason ?? null, times[0], withdrawn?.at ?? times.at(-1), ...words],
    ],
  );
  for (const [index, { content, typeset, checked }] of revisions.entries()) {
    const { at, change } = identity.revisions[index];
    const [revision] = await rows(
      `INSERT INTO revisions (identity_id, number, name, kind, field, statement, hypotheses, place, uniformizer, value, warning,
                              reference, doi, arxiv, tags, remark, change, typeset, author_id, author_name, created_at)
       VALUES ($1, $2, $3, $4, $5, $6, $7, $8, $9, $10, $11, $12, $13, $14, $15, $16, $17, $18, $19, $20, $21)
       RETURNING id`,
      [
        ...[id, index + 1, content.name, content.kind, content.field, content.statement, content.hypotheses],
        ...[content.place ?? null, content.uniformizer ?? null, content.value ?? null, content.warning],
        ...[content.reference ?? null, content.doi ?? null, content.arxiv ?? null, content.tags],
        ...[content.remark ?? null, change ?? null, JSON.stringify(typeset), keeperId, keeper, at],
      ],
    );
    await rows(
      `INSERT INTO checks (revision_id, verdict, evidence, engine, duration_ms, created_at)
       VALUES ($1, $2, $3, $4, $5, $6)`,
      [revision.id, checked.verdict, JSON.stringify(checked.evidence), checked.engine, checked.durationMs, at],
    );
  }
}

/** What the program would have written down, had these people kept all this themselves. */
function eventsOf(key, { keeper: who, revisions, withdrawn }, { revisions: written }) {
  const events = revisions.map(({ at, change }, index) => {
    const { content, checked } = written[index];
    return index === 0
      ? { at, action: 'identity-kept', detail: { name: content.name, verdict: checked.verdict } }
      : { at, action: 'identity-revised', detail: { revision: index + 1, verdict: checked.verdict, change } };
  });
  if (withdrawn !== undefined)
    events.push({
      at: withdrawn.at,
      action: 'identity-withdrawn',
      detail: { revision: revisions.length, reason: withdrawn.reason },
    });
  return events.map((event) => ({ ...event, who, subject: key }));
}
