import { expect, test } from 'vitest';
import { healthAnswer } from '@/lib/contracts/health';
import { get, send } from '../../harness/http';
import { expectDescribed } from '../batteries/described';

const path = '/api/v1/health';

test('the service and its database are well', async () => {
  const answer = await get(path);
  expect(answer).toMatchObject({ status: 200, type: 'application/json' });
  await expectDescribed('get', path, answer);
  expect(healthAnswer.parse(answer.body)).toMatchObject({ status: 'ok', database: 'ok' });
});

test('HEAD answers as GET does, without the body', async () => {
  expect(await send(path, { method: 'HEAD' })).toMatchObject({ status: 200, type: 'application/json', text: '' });
});
