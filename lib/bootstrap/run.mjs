import { spawn } from 'node:child_process';
import fs from 'node:fs';
import path from 'node:path';
import { inState, makeStateFolder, root } from './paths.mjs';
import { end, identify, runs } from './process-identity.mjs';
import { Trouble } from './trouble.mjs';

const recordFolder = () => inState('runs');
const recordFile = (name) => path.join(recordFolder(), `${name}.json`);

function readRecord(file) {
  try {
    return JSON.parse(fs.readFileSync(file, 'utf8'));
  } catch {
    return undefined;
  }
}

/** Ends what a run left behind that was killed before it could tidy up. */
async function sweep(file, record) {
  for (const child of [...(record?.children ?? [])].reverse()) await end(child, child.signal);
  for (const folder of record?.folders ?? []) fs.rmSync(folder, { recursive: true, force: true });
  // Another start may have swept the same record meanwhile and put its own in its place.
  if (readRecord(file)?.owner.pid === record?.owner.pid) fs.rmSync(file, { force: true });
}

async function sweepAll() {
  for (const entry of fs.readdirSync(recordFolder())) {
    if (!entry.endsWith('.json')) continue;
    const file = path.join(recordFolder(), entry);
    const record = readRecord(file);
    if (record === undefined || !runs(record.owner)) await sweep(file, record);
  }
}

/** The records of the runs that are under way in this clone, but for the one of this process. */
export function otherRuns() {
  const files = fs.readdirSync(recordFolder()).filter((entry) => entry.endsWith('.json'));
  const records = files.map((entry) => readRecord(path.join(recordFolder(), entry)));
  return records.filter((record) => record !== undefined && record.owner.pid !== process.pid && runs(record.owner));
}

/** The run that serves from this clone, if there is one: its process and its address. */
export function servingRun() {
  const record = readRecord(recordFile('server'));
  return record?.address !== undefined && runs(record.owner)
    ? { pid: record.owner.pid, address: record.address }
    : undefined;
}

/**
 * One run of a launcher: it knows every process and folder it made, has them on record, and removes them when it ends —
 * or has them removed by the next run, should it be killed.
 */
export class Run {
  #file;
  #record;
  #leaving = false;

  constructor(file, record) {
    this.#file = file;
    this.#record = record;
  }

  /**
   * Begins a run. Only one run named `server` may be there at a time; any other name is made unique by its process number.
   */
  static async begin(name, command) {
    makeStateFolder();
    fs.mkdirSync(recordFolder(), { recursive: true });
    await sweepAll();
    const file = recordFile(name === 'server' ? name : `${name}-${process.pid}`);
    const record = { owner: identify(process.pid), command, children: [], folders: [] };
    const draft = `${file}.${process.pid}`;
    fs.writeFileSync(draft, JSON.stringify(record));
    try {
      fs.linkSync(draft, file); // fails when the name is taken, so that of two starts at once one wins
    } catch {
      const other = readRecord(file);
      const address = other?.address === undefined ? 'is just starting' : `serves ${other.address}`;
      throw new Trouble(
        `"${other?.command ?? 'Another start'}" (process ${other?.owner.pid ?? 'unknown'}) ${address} from this folder.`,
        'Use that one, or stop it first (Ctrl-C in its window, or kill with its number). A second clone can run beside it with a PORT of its own.',
      );
    } finally {
      fs.rmSync(draft, { force: true });
    }
    return new Run(file, record);
  }

  #save() {
    const draft = `${this.#file}.new`;
    fs.writeFileSync(draft, JSON.stringify(this.#record));
    fs.renameSync(draft, this.#file);
  }

  /** Notes where this run serves, for whoever starts a second one. */
  serves(address) {
    this.#record.address = address;
    this.#save();
  }

  /** A folder that goes when the run ends. */
  ownFolder(folder) {
    this.#record.folders.push(folder);
    this.#save();
  }

  get leaving() {
    return this.#leaving;
  }

  /**
   * Starts a process of its own group, so that Ctrl-C reaches the launcher alone and things stop in order. `signal` is how
   * it is asked to end.
   */
  start(command, args, { signal = 'SIGTERM', stdio = 'inherit', ...options } = {}) {
    if (this.#leaving) throw new Trouble('The run is being stopped.', 'Start it again.');
    const child = spawn(command, args, { cwd: root, detached: true, stdio, ...options });
    child.on('error', () => undefined); // reported through `ended`
    const entry = { ...identify(child.pid ?? -1), signal };
    const ended = new Promise((resolve) => {
      child.once('error', (error) => resolve({ code: undefined, error }));
      child.once('exit', (code, by) => resolve({ code: code ?? undefined, by: by ?? undefined }));
    }).then((result) => {
      this.#record.children = this.#record.children.filter((other) => other !== entry);
      if (!this.#leaving) this.#save();
      return result;
    });
    this.#record.children.push(entry);
    this.#save();
    return { child, ended, stop: () => end(entry, signal).then(() => ended) };
  }

  /** Runs a command to its end and returns its exit code; undefined when it was killed or could not be started. */
  async finish(command, args, options) {
    return (await this.start(command, args, options).ended).code;
  }

  /** Ends everything this run started, the youngest first. */
  async leave() {
    if (this.#leaving) return;
    this.#leaving = true;
    for (const child of [...this.#record.children].reverse()) await end(child, child.signal);
    for (const folder of this.#record.folders) fs.rmSync(folder, { recursive: true, force: true });
    fs.rmSync(this.#file, { force: true });
  }
}
