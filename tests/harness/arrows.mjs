// The rooms of the project and the arrows between them: what a file may import. The lint rule and a test both read this
// table. A room is a folder; the longest one that holds a file is its room; one file may be a room of its own. A room may always import itself.
export const rooms = [
  { room: 'engine/arith', rooms: [], packages: ['big-integer'] },
  { room: 'engine/expression', rooms: [], packages: [] },
  { room: 'engine/field', rooms: ['engine/arith', 'engine/expression'], packages: [] },
  { room: 'engine/ring', rooms: ['engine/arith', 'engine/field', 'engine/expression'], packages: [] },
  { room: 'engine/place', rooms: ['engine/arith', 'engine/field', 'engine/ring', 'engine/expression'], packages: [] },
  { room: 'engine/derive', rooms: ['engine/arith', 'engine/field', 'engine/ring', 'engine/expression'], packages: [] },
  {
    room: 'engine/decide',
    rooms: ['engine/arith', 'engine/field', 'engine/ring', 'engine/place', 'engine/derive', 'engine/expression'],
    packages: [],
  },
  { room: 'engine/version', rooms: [], packages: [] },
  { room: 'grammar/write-source', rooms: [], packages: ['node', 'ohm-js'] },
  { room: 'grammar', rooms: ['engine/expression'], packages: ['ohm-js'] },
  { room: 'models', rooms: [], packages: ['sequelize'] },
  { room: 'migrations', rooms: [], packages: ['sequelize'] },
  { room: 'seeders', rooms: [], packages: ['sequelize', '@node-rs/argon2', 'node'] },
  { room: 'lib/contracts', rooms: ['models/identity-words', 'models/role', 'models/scope'], packages: ['zod'] },
  {
    room: 'lib/compute',
    rooms: ['engine', 'grammar', 'lib/contracts', 'lib/config'],
    packages: ['piscina', 'server-only', 'node'],
  },
  { room: 'lib/config', rooms: [], packages: ['zod'] },
  {
    room: 'lib/database',
    rooms: ['lib/config', 'models'],
    packages: ['sequelize', 'pg', 'umzug', 'graphile-worker', 'server-only', 'node'],
  },
  { room: 'lib/bootstrap', rooms: ['lib/database'], packages: ['esbuild', 'pg', 'smtp-server', 'node'] },
  {
    room: 'lib/register',
    rooms: ['lib', 'models', 'grammar', 'engine/expression', 'engine/version'],
    packages: ['sequelize', 'zod', 'server-only', 'node'],
  },
  { room: 'lib/mail', rooms: ['lib/config'], packages: ['nodemailer', 'server-only'] },
  { room: 'lib', rooms: ['lib', 'models', 'engine/version'], packages: 'any' },
  { room: 'app', rooms: ['lib', 'grammar', 'engine/expression', 'engine/version', 'package.json'], packages: 'any' },
  { room: 'package.json', rooms: [], packages: [] },
  // The slow road of the tests shares no code with the engine but the tree.
  { room: 'tests/oracle', rooms: ['engine/expression'], packages: [] },
  {
    room: 'tests',
    rooms: ['tests', 'app', 'engine', 'grammar', 'lib', 'models', 'migrations', 'seeders', 'package.json'],
    packages: 'any',
  },
];

/** What code that runs in the browser may import of the project, whatever its room allows. */
export const clientRooms = ['app', 'lib/contracts', 'grammar', 'engine/expression'];

/** Rooms that run in Node, in a worker thread and in the browser alike, and decide nothing by clock or chance. */
export const pureRooms = ['engine', 'grammar'];

/** A room of one file is named without its ending, as an import names it. */
const holds = (room, file) => file.replace(/\.(ts|tsx|mjs)$/, '') === room || file.startsWith(`${room}/`);

/** The row of the room a file (its path from the root) lies in; undefined for a file at the root. */
export const roomOf = (file) =>
  rooms.filter(({ room }) => holds(room, file)).sort((a, b) => b.room.length - a.room.length)[0];

/** Whether a file may import another file of the project, both given by their paths from the root. */
export function mayImportFile(file, target) {
  const from = roomOf(file);
  const to = roomOf(target);
  if (from === undefined) return true;
  if (to === undefined) return from.room === 'tests';
  return to.room === from.room || from.rooms.some((room) => holds(room, target));
}

/** Whether a file may import a package; `node` stands for all of Node's own modules. */
export function mayImportPackage(file, name) {
  const from = roomOf(file);
  return from === undefined || from.packages === 'any' || from.packages.includes(name);
}

/** Whether client code may import a file of the project. */
export const clientMayImport = (target) => clientRooms.some((room) => holds(room, target));
