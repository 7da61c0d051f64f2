import { expect, test } from 'vitest';
import { Busy, Slots } from '@/lib/compute/slots';

/** A piece of work that ends when it is told to. */
function gate() {
  let open: () => void = () => undefined;
  const passed = new Promise<void>((resolve) => (open = resolve));
  return { passed, open: () => open() };
}

const settled = () => new Promise((resolve) => setImmediate(resolve));

test('no more run at once than there are slots, and the next begins when one ends', async () => {
  const slots = new Slots(2, 10);
  const gates = [gate(), gate(), gate()];
  const begun: number[] = [];
  const runs = gates.map(({ passed }, index) =>
    slots.run(
      async () => {
        begun.push(index);
        await passed;
        return index;
      },
      { urgent: true },
    ),
  );
  await settled();
  expect(begun).toEqual([0, 1]);
  gates[1]?.open();
  expect(await runs[1]).toBe(1);
  await settled();
  expect(begun).toEqual([0, 1, 2]);
  gates[0]?.open();
  gates[2]?.open();
  expect(await Promise.all(runs)).toEqual([0, 1, 2]);
});

test('the urgent go before the patient, each in their order', async () => {
  const slots = new Slots(1, 10);
  const first = gate();
  const order: string[] = [];
  const run = (name: string, urgent: boolean) => slots.run(async () => void order.push(name), { urgent });
  const holding = slots.run(() => first.passed, { urgent: true });
  const others = [run('p1', false), run('u1', true), run('p2', false), run('u2', true)];
  first.open();
  await Promise.all([holding, ...others]);
  expect(order).toEqual(['u1', 'u2', 'p1', 'p2']);
});

test('a full queue turns away, and who waits is not harmed', async () => {
  const slots = new Slots(1, 1);
  const first = gate();
  const holding = slots.run(() => first.passed, { urgent: true });
  const waiting = slots.run(async () => 'served', { urgent: true });
  await expect(slots.run(async () => 'no', { urgent: true })).rejects.toBeInstanceOf(Busy);
  first.open();
  await holding;
  expect(await waiting).toBe('served');
});

test('one who goes away leaves the queue, and a failure frees its slot', async () => {
  const slots = new Slots(1, 1);
  const first = gate();
  const leaving = new AbortController();
  const holding = slots.run(
    async () => {
      await first.passed;
      throw new Error('failed');
    },
    { urgent: true },
  );
  const gone = slots.run(async () => 'never', { urgent: true, signal: leaving.signal });
  leaving.abort(new Error('gone'));
  await expect(gone).rejects.toThrow('gone');
  const next = slots.run(async () => 'served', { urgent: true });
  first.open();
  await expect(holding).rejects.toThrow('failed');
  expect(await next).toBe('served');
});
