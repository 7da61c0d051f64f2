// npx tsx --conditions=react-server tests/demo/record.ts: has the engine check the demo anew and records what it says.
import fs from 'node:fs';
import { computeDemo, recordedFile } from './compute';

// The engine is asked as the server asks it; neither a database nor a session has part in it.
process.env.DATABASE_URL ??= 'postgres://127.0.0.1/none';
process.env.NEXTAUTH_SECRET ??= 'nothing is signed by this program';

const computed = await computeDemo();
fs.writeFileSync(recordedFile, `${JSON.stringify(computed, null, 1)}\n`);
process.stdout.write(`Recorded ${Object.keys(computed).length} identities.\n`);
process.exit(0);
