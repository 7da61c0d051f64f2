import fs from 'node:fs';

/**
 * When a process began, in clock ticks since the machine came up, or undefined when there is none. Numbers of processes are
 * used again; a number and a beginning together are not.
 */
export function beginning(pid) {
  try {
    const stat = fs.readFileSync(`/proc/${pid}/stat`, 'utf8');
    // The second field is the name in parentheses and may itself hold spaces and parentheses.
    const fields = stat.slice(stat.lastIndexOf(')') + 2).split(' ');
    return fields[0] === 'Z' ? undefined : fields[19];
  } catch {
    return undefined;
  }
}

export const identify = (pid) => ({ pid, began: beginning(pid) });

/** Whether the very process that was identified still runs. */
export const runs = (identity) => identity.began !== undefined && beginning(identity.pid) === identity.began;

const pause = (milliseconds) => new Promise((resolve) => setTimeout(resolve, milliseconds));

/**
 * Signals a process that was identified (its whole group when it leads one) and waits for its end; harder after the patience is
 * over. A database, which is ended by SIGINT, has longer: it first writes what it holds in memory.
 */
export async function end(identity, signal, patience = signal === 'SIGINT' ? 60_000 : 10_000) {
  const send = (name) => {
    for (const target of [-identity.pid, identity.pid]) {
      try {
        process.kill(target, name);
        return;
      } catch {
        // No such group: the process itself is next. No such process: nothing is left to end.
      }
    }
  };
  if (!runs(identity)) return;
  send(signal);
  for (let waited = 0; runs(identity); waited += 50) {
    if (waited >= patience) send('SIGKILL');
    if (waited >= 2 * patience) return;
    await pause(50);
  }
}
