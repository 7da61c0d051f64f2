import { test } from 'vitest';
import { post } from '../../harness/http';
import { expectProblem } from '../batteries/described';

const path = '/api/v1/residues';
const ask = (more: Record<string, unknown>) => post(path, { field: 'Q', expression: '[7][5]', ...more });

test('a number that is no prime is no place', async () => {
  await expectProblem(path, await ask({ places: ['4'] }), 422, 'place');
});

test('a uniformizer has valuation 1 and goes with one place', async () => {
  await expectProblem(path, await ask({ places: ['7'], uniformizer: '49' }), 422, 'uniformizer');
  await expectProblem(path, await ask({ places: ['7'], uniformizer: '0' }), 422, 'not-a-unit');
  await expectProblem(path, await ask({ places: ['7', '5'], uniformizer: '7' }), 422, 'invalid', {
    part: 'uniformizer',
  });
  await expectProblem(path, await ask({ uniformizer: '7' }), 422, 'invalid', { part: 'uniformizer' });
});

test('a uniformizer that cannot be read', async () => {
  await expectProblem(path, await ask({ places: ['7'], uniformizer: '7+' }), 422, 'syntax', { part: 'uniformizer' });
});

test('fields without residues say so', async () => {
  await expectProblem(path, await ask({ field: 'F_7', expression: '[5]' }), 422, 'place');
});
