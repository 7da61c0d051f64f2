/** Why a question was not let in. */
export class Busy extends Error {
  override readonly name = 'Busy';
}

interface Waiting {
  readonly enter: () => void;
}

/**
 * A fixed number of places, and two queues of bounded length before them. First come, first served, but those who wait for an
 * answer on a screen go before those who asked for many at once.
 */
export class Slots {
  private free: number;
  private readonly urgent: Waiting[] = [];
  private readonly patient: Waiting[] = [];

  constructor(
    slots: number,
    private readonly longestQueue: number,
  ) {
    this.free = slots;
  }

  /** Runs `work` once there is a place. Throws `Busy` when the queue is full, and the signal's reason when it is aborted. */
  async run<Result>(
    work: () => Promise<Result>,
    { urgent, signal }: { readonly urgent: boolean; readonly signal?: AbortSignal },
  ): Promise<Result> {
    signal?.throwIfAborted();
    if (this.free > 0) this.free -= 1;
    else await this.wait(urgent ? this.urgent : this.patient, signal);
    try {
      return await work();
    } finally {
      const next = this.urgent.shift() ?? this.patient.shift();
      if (next === undefined) this.free += 1;
      else next.enter();
    }
  }

  private wait(queue: Waiting[], signal: AbortSignal | undefined): Promise<void> {
    if (queue.length >= this.longestQueue) throw new Busy('Too many questions are waiting.');
    return new Promise((resolve, reject) => {
      const leave = () => {
        const index = queue.indexOf(waiting);
        if (index >= 0) queue.splice(index, 1);
        reject(signal?.reason);
      };
      const waiting: Waiting = {
        enter: () => {
          signal?.removeEventListener('abort', leave);
          resolve();
        },
      };
      signal?.addEventListener('abort', leave, { once: true });
      queue.push(waiting);
    });
  }
}
