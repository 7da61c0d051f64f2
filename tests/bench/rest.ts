import autocannon from 'autocannon';

const connections = 32;
const seconds = Number(process.env.BENCH_SECONDS ?? 10);
const base = process.env.QUADREL_URL ?? 'http://127.0.0.1:3000';

/** One run of `compare` on a short word over loopback. */
const load = (duration: number) =>
  autocannon({
    url: `${base}/api/v1/compare`,
    connections,
    duration,
    method: 'POST',
    headers: { 'content-type': 'application/json' },
    body: JSON.stringify({ field: 'Q', left: '[2][-1] + 3[5][7]', right: '[-1][2] + 3[5][7]' }),
  });

// The first second compiles and opens connections; it is not counted.
await load(2);
const { requests, latency, errors, non2xx } = await load(seconds);
const [p50, p99] = [latency.p50, latency.p99];
console.log(`compare, ${connections} connections, ${seconds} s: ${requests.average.toFixed(0)} answers a second`);
console.log(`p50 ${p50} ms, p99 ${p99} ms, ratio ${(p99 / p50).toFixed(1)} (allowed: under 20)`);
if (errors + non2xx > 0) console.log(`${errors} errors, ${non2xx} answers that are no success`);
if (errors + non2xx > 0 || !(p99 < 20 * p50)) process.exitCode = 1;
