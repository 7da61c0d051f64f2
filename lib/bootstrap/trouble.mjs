/** A failure a person can do something about: what happened, and what to do. */
export class Trouble extends Error {
  constructor(what, remedy) {
    super(what);
    this.name = 'Trouble';
    this.remedy = remedy;
  }
}

/** One line about what is going on. */
export function say(text) {
  process.stdout.write(`${text}\n`);
}

/** What went wrong, for a person: a trouble with its remedy, anything else with its stack. */
export function explain(error) {
  if (error instanceof Trouble) return `\nStopped: ${error.message}\n${error.remedy}\n`;
  return `\nStopped by a defect of this program.\n${error instanceof Error ? error.stack : String(error)}\n`;
}
