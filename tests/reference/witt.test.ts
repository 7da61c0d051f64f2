import { describe, expect, it } from 'vitest';
import { randomBetween, seeded } from '@/engine/arith/seeded';
import { judge } from '../property/kmw-engine';
import { gpLines } from './arith-gp';

const stream = seeded(1937);
const random = (low: bigint, high: bigint): bigint => randomBetween(low, high, stream);
const pick = <T>(list: readonly T[]): T => list[Number(random(0n, BigInt(list.length - 1)))] as T;

type Diagonal = readonly bigint[];

const entry = (): bigint => {
  const n = random(-40n, 40n);
  return n === 0n ? 1n : n;
};
const diagonal = (rank: number): Diagonal => Array.from({ length: rank }, entry);

/** Changes that keep the class in W(ℚ): squares, order, a plane more, the Witt relation ⟨a, b⟩ = ⟨a + b, ab(a + b)⟩. */
function rewritten(form: Diagonal, steps: number): Diagonal {
  let current = [...form];
  for (let i = 0; i < steps; i += 1) {
    const at = Number(random(0n, BigInt(current.length - 1)));
    const [a = 1n, b = 1n] = [current[at], current[(at + 1) % current.length]];
    const kind = pick(['square', 'turn', 'witt', 'witt', 'witt', 'plane']);
    if (kind === 'square') current[at] = a * random(1n, 6n) ** 2n;
    if (kind === 'turn') current = [...current.slice(at), ...current.slice(0, at)];
    if (kind === 'plane' && current.length < 8) {
      const c = entry();
      current.push(c, -c);
    }
    if (
      kind === 'witt' &&
      a + b !== 0n &&
      current.length > 1 &&
      a * b * (a + b) < 10n ** 15n &&
      a * b * (a + b) > -(10n ** 15n)
    ) {
      current[at] = a + b;
      current[(at + 1) % current.length] = a * b * (a + b);
    }
  }
  return current;
}

/** A small edit, now and then one that rank, discriminant and signature do not see. */
function edited(form: Diagonal): Diagonal {
  const at = Number(random(0n, BigInt(form.length - 1)));
  const next = (at + 1) % form.length;
  const scale = pick([-1n, 2n, 3n, 5n, 7n]);
  if (form.length > 1 && random(0n, 2n) > 0n) return form.map((a, i) => (i === at || i === next ? a * scale : a));
  return form.map((a, i) => (i === at ? a * pick([-1n, scale]) : a));
}

/**
 * By PARI/GP: a − b is a sum of planes iff its rank is even, its signed discriminant a square, its signature 0 and its Hasse
 * invariant at every prime that of so many planes (Hasse–Minkowski; J.-P. Serre, A Course in Arithmetic, IV.2.3 and IV.3.3).
 */
const GP = `
hasse(v,p)=prod(i=1,#v,prod(j=i+1,#v,hilbert(v[i],v[j],p)));
planes(v)={my(n=#v,m,P);if(n%2,return([0,"rank"]));m=n/2;
if(!issquare((-1)^m*vecprod(v)),return([0,"discriminant"]));
if(vecsum(vector(n,i,sign(v[i]))),return([0,"signature"]));
P=Set(concat([[2],concat(vector(n,i,factor(abs(v[i]))[,1]~))]));
for(i=1,#P,if(hasse(v,P[i])!=if(m*(m-1)/2%2,hilbert(-1,-1,P[i]),1),return([0,"hasse"])));
[1,"equal"]};
`;

describe('equality in W(ℚ) against the local symbols of PARI/GP', () => {
  it('agrees on hundreds of pairs, equal by construction, nearly equal, and at random', () => {
    const pairs = Array.from({ length: 600 }, (_, i): readonly [Diagonal, Diagonal] => {
      const form = diagonal(Number(random(1n, 5n)));
      if (i % 3 === 0) return [form, rewritten(form, 6)];
      if (i % 3 === 1) return [form, rewritten(edited(form), 4)];
      return [form, diagonal(Number(random(1n, 5n)))];
    });
    const lines = gpLines(
      GP.replaceAll(/\{([\s\S]*)\};/g, (_, body: string) => `{${body.replaceAll('\n', '')}};`) +
        pairs.map(([l, r]) => `print(planes([${[...l, ...r.map((a) => -a)].join(',')}]))`).join('\n'),
    );
    const reasons = new Map<string, number>();
    pairs.forEach(([l, r], i) => {
      const [, equal, reason = ''] = /^\[([01]), "?([a-z]+)"?\]$/.exec(lines[i] ?? '') ?? [];
      const [left, right] = [l, r].map((form) => `<${form.join(', ')}>`) as [string, string];
      const inWitt = judge('Q', `eta*${left}`, `eta*${right}`);
      expect(inWitt.verdict, `eta${left} = eta${right}: ${lines[i]}`).toBe(equal === '1' ? 'equal' : 'different');
      expect(inWitt.evidence.modH).toBe(equal === '1');
      // in GW the rank as well
      const forms = judge('Q', left, right);
      expect(forms.verdict).toBe(equal === '1' && l.length === r.length ? 'equal' : 'different');
      expect(forms.evidence.modH).toBe(equal === '1');
      expect(forms.evidence.modEta).toBe(l.length === r.length);
      reasons.set(reason, (reasons.get(reason) ?? 0) + 1);
    });
    expect(lines.length).toBe(pairs.length);
    expect([...reasons.keys()].sort()).toEqual(['discriminant', 'equal', 'hasse', 'rank', 'signature']);
    expect(reasons.get('equal')).toBeGreaterThan(190);
    expect(reasons.get('hasse')).toBeGreaterThan(20);
  });

  it('agrees on products of forms and on Pfister forms', () => {
    const cases = Array.from({ length: 150 }, () => {
      const [l, r] = [diagonal(Number(random(1n, 3n))), diagonal(Number(random(1n, 2n)))];
      const product = l.flatMap((a) => r.map((b) => a * b));
      const other = random(0n, 1n) === 0n ? rewritten(product, 3) : edited(product);
      return { l, r, product, other };
    });
    const lines = gpLines(
      GP.replaceAll(/\{([\s\S]*)\};/g, (_, body: string) => `{${body.replaceAll('\n', '')}};`) +
        cases
          .map(({ product, other }) => `print(planes([${[...product, ...other.map((a) => -a)].join(',')}])[1])`)
          .join('\n'),
    );
    cases.forEach(({ l, r, other }, i) => {
      const outcome = judge('Q', `eta^2<${l.join(', ')}><${r.join(', ')}>`, `eta^2<${other.join(', ')}>`);
      expect(outcome.verdict).toBe(lines[i] === '1' ? 'equal' : 'different');
    });
    expect(new Set(lines)).toEqual(new Set(['0', '1']));
  });
});
