import { expect, test } from 'vitest';
import { residuesAnswer } from '@/lib/contracts/residues';
import { post } from '../../harness/http';
import { expectDescribed } from '../batteries/described';

const path = '/api/v1/residues';

async function residues(body: Record<string, unknown>) {
  const answer = await post(path, { field: 'Q', ...body });
  expect(answer).toMatchObject({ status: 200, type: 'application/json' });
  await expectDescribed('post', path, answer);
  return residuesAnswer.parse(answer.body);
}

const isEqual = async (field: string, left: string, right: string) => {
  const { body } = await post('/api/v1/compare', { field, left, right });
  return (body as { verdict: string }).verdict === 'equal';
};

test('without places, every place where the class ramifies', async () => {
  const { residues: list, unramifiedElsewhere } = await residues({ expression: '[7][5]' });
  expect(unramifiedElsewhere).toBe(true);
  expect(list.map(({ place, residueField, zero }) => ({ place, residueField, zero }))).toEqual([
    { place: '5', residueField: 'F_5', zero: false },
    { place: '7', residueField: 'F_7', zero: false },
  ]);
  // ∂_5([7][5]) = -<-1>∂([5][7]) = ε[7], and ∂_7([7][5]) = [5].
  expect(await isEqual('F_5', list[0]?.value.text ?? '', 'eps [7]')).toBe(true);
  expect(await isEqual('F_7', list[1]?.value.text ?? '', '[5]')).toBe(true);
});

test('a place that is asked for is listed, ramified or not', async () => {
  const { residues: list, unramifiedElsewhere } = await residues({ expression: '[7][5]', places: ['3', '7'] });
  expect(list.map(({ place, zero }) => [place, zero])).toEqual([
    ['3', true],
    ['7', false],
  ]);
  expect(unramifiedElsewhere).toBe(false);
});

test('a uniformizer by hand changes the residue by the square class of the unit', async () => {
  // ∂ for the uniformizer 3·7 is <3> times that for 7.
  const { residues: list } = await residues({ expression: '[7][5]', places: ['7'], uniformizer: '21' });
  expect(list[0]?.uniformizer).toBe('21');
  expect(await isEqual('F_7', list[0]?.value.text ?? '', '<3>[5]')).toBe(true);
});
