import { test } from 'vitest';
import { post } from '../../harness/http';
import { expectProblem } from '../batteries/described';
import { transportBattery } from '../batteries/transport';

const path = '/api/v1/residues';
const body = { field: 'Q', expression: '[7][2]' };

transportBattery(path, { body });

test('more places than are allowed are refused', async () => {
  const answer = await post(path, { ...body, places: Array.from({ length: 101 }, () => '7') });
  await expectProblem(path, answer, 422, 'invalid', { part: 'places' });
});

test.each(['', ' ', '7; DROP TABLE permalinks', '<b>7</b>', '7\r\nX: y', '9'.repeat(5000), '-7', '1', '0', '4'])(
  'the place %j is none',
  async (place) => {
    await expectProblem(path, await post(path, { ...body, places: [place] }), 422, 'place');
  },
);
