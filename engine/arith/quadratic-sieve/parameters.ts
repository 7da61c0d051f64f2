/** How the sieve is set up for a number of a given length. */
export interface Parameters {
  /** Primes in the factor base. */
  readonly size: number;
  /** x runs from −half to half − 1. */
  readonly half: number;
  /** One prime outside the base may divide a value, up to this multiple of the largest prime of the base. */
  readonly largePrime: number;
}

/** Found by trial: binary digits of kN, size, half, largePrime. Between two rows the size is interpolated. */
const table: readonly (readonly [bits: number, size: number, half: number, largePrime: number])[] = [
  [50, 50, 8192, 20],
  [80, 100, 16384, 30],
  [100, 170, 32768, 40],
  [120, 330, 32768, 40],
  [135, 520, 32768, 50],
  [150, 900, 65536, 50],
  [170, 1600, 65536, 60],
  [190, 2600, 131072, 60],
  [210, 4800, 131072, 80],
  [235, 9000, 262144, 100],
  [260, 20000, 262144, 100],
];

export function parameters(bits: number): Parameters {
  const above = table.findIndex(([length]) => length >= bits);
  const [hiBits, hiSize, half, largePrime] = table[above === -1 ? table.length - 1 : above]!;
  if (above <= 0) return { size: hiSize, half, largePrime };
  const [loBits, loSize] = table[above - 1]!;
  const part = (hiSize - loSize) * (bits - loBits);
  const width = hiBits - loBits;
  return { size: loSize + (part - (part % width)) / width, half, largePrime };
}
