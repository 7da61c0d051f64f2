/** CPU milliseconds of some work, the least of several runs. */
export function cpuCost(work: () => void, runs: number): number {
  let least = Number.POSITIVE_INFINITY;
  for (let i = 0; i < runs; i += 1) {
    const from = process.cpuUsage();
    work();
    const { user, system } = process.cpuUsage(from);
    least = Math.min(least, (user + system) / 1000);
  }
  return least;
}

/** The exponent k of the best fit y = c·xᵏ. */
export function fittedExponent(points: readonly (readonly [number, number])[]): number {
  const logs = points.map(([x, y]) => [Math.log(x), Math.log(y)] as const);
  const mean = (values: readonly number[]): number => values.reduce((a, b) => a + b, 0) / values.length;
  const [mx, my] = [mean(logs.map(([x]) => x)), mean(logs.map(([, y]) => y))];
  return mean(logs.map(([x, y]) => (x - mx) * (y - my))) / mean(logs.map(([x]) => (x - mx) ** 2));
}
