import { Trouble } from './trouble.mjs';

/** Waits until the server answers that it is well; `ended` settles when its process is over. */
export async function untilHealthy(address, ended, seconds = 90) {
  let over = false;
  void ended.then(() => (over = true));
  let last = 'it did not answer';
  for (const limit = Date.now() + 1000 * seconds; Date.now() < limit && !over;) {
    try {
      const response = await fetch(`${address}/api/v1/health`, { signal: AbortSignal.timeout(10_000) });
      if (response.ok) return;
      last = `its health is ${response.status}: ${(await response.text()).slice(0, 300)}`;
    } catch (error) {
      last = `it did not answer (${error.cause?.code ?? error.message})`;
    }
    await new Promise((resolve) => setTimeout(resolve, 100));
  }
  throw new Trouble(
    over ? 'The server ended before it answered.' : `The server is not well after ${seconds} seconds: ${last}.`,
    'Its messages stand above and in .quadrel/server.log; correct what they name, then start again.',
  );
}
