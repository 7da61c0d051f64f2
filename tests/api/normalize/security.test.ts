import { expect, test } from 'vitest';
import { post } from '../../harness/http';
import { expectProblem } from '../batteries/described';
import { transportBattery } from '../batteries/transport';

const path = '/api/v1/normalize';
const body = { field: 'Q', expression: '[2][-1]' };

transportBattery(path, { body });

test('markup in the text comes back inside JSON, in a problem document', async () => {
  const answer = await post(path, { field: 'Q', expression: '<script>alert(1)</script>' });
  await expectProblem(path, answer, 422, 'syntax', { part: 'expression', line: 1 });
});

test('control signs and half characters in the text are refused, not echoed raw', async () => {
  for (const expression of ['[2]\u0000', '[2]\r\nSet-Cookie: a=b', '\ud800[2]', '[2]\u202e']) {
    const answer = await post(path, { field: 'Q', expression });
    await expectProblem(path, answer, 422, 'syntax');
    expect(answer.headers.get('set-cookie')).toBeNull();
  }
});

test.each([
  ['too long', `[2]${'+[2]'.repeat(6000)}`],
  ['too deep', `${'('.repeat(300)}1${')'.repeat(300)}`],
  ['too large an exponent of a word', '[2]^65'],
  ['too large an exponent in an entry', '[2^10001]'],
])('an expression that is %s is refused as text', async (_, expression) => {
  await expectProblem(path, await post(path, { field: 'Q', expression }), 422, 'syntax', { part: 'expression' });
});

test('towers of powers end at a size limit', async () => {
  const answer = await post(path, { field: 'Q', expression: '(((([2]+2)^64)^64)^64)^64' });
  await expectProblem(path, answer, 503, 'size');
});
