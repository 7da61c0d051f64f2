import { randomBytes } from 'node:crypto';
import fs from 'node:fs';
import path from 'node:path';

const most = 500;

/** The messages of a mailbox as paths of files, the oldest first. */
export function filesOf(folder) {
  if (!fs.existsSync(folder)) return [];
  const names = fs.readdirSync(folder).filter((name) => name.endsWith('.eml'));
  return names.sort().map((name) => path.join(folder, name));
}

/** Keeps one message in a file that only its owner can read, and of all messages the newest. */
function keep(folder, message) {
  const name = `${new Date().toISOString().replace(/[:.]/g, '-')}-${randomBytes(4).toString('hex')}`;
  const draft = path.join(folder, `${name}.part`);
  fs.writeFileSync(draft, message, { mode: 0o600 });
  fs.renameSync(draft, path.join(folder, `${name}.eml`));
  for (const old of filesOf(folder).slice(0, -most)) fs.rmSync(old, { force: true });
}

/**
 * Stands in for a mail service: takes every message on a port of loopback and keeps it in a file. Nothing is passed on, and
 * nothing is shown over HTTP, for the messages hold links that sign people in.
 */
export async function openMailbox(folder, port = 0) {
  const { SMTPServer } = await import('smtp-server');
  fs.mkdirSync(folder, { recursive: true, mode: 0o700 });
  fs.chmodSync(folder, 0o700);
  const server = new SMTPServer({
    name: 'localhost',
    banner: 'Quadrel mailbox',
    size: 10 * 1024 * 1024,
    disabledCommands: ['AUTH', 'STARTTLS'],
    disableReverseLookup: true,
    onData(stream, _session, callback) {
      const chunks = [];
      stream.on('data', (chunk) => chunks.push(chunk));
      stream.on('end', () => {
        if (stream.sizeExceeded) return callback(new Error('The message is larger than 10 MB.'));
        try {
          keep(folder, Buffer.concat(chunks));
          callback();
        } catch (error) {
          callback(error);
        }
      });
    },
  });
  // A client that breaks off harms nobody else.
  server.on('error', () => undefined);
  await new Promise((resolve, reject) => {
    server.server.once('error', reject);
    server.listen(port, '127.0.0.1', resolve);
  });
  return {
    url: `smtp://127.0.0.1:${server.server.address().port}`,
    close: () => new Promise((resolve) => server.close(() => resolve(undefined))),
  };
}
