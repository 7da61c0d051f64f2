import { expect, test } from 'vitest';
import { unlimited } from '@/engine/arith/budget';
import { engineVersion } from '@/engine/version';
import { answer } from '@/lib/compute/answer';
import type { ComputeRequest } from '@/lib/compute/request';
import { compareRequest } from '@/lib/contracts/compare';
import { compareManyContract, compareManyRequest } from '@/lib/contracts/compare-many';
import { contracts } from '@/lib/openapi/contracts';

const singles = contracts.flatMap(({ operation, examples }) =>
  ['normalize', 'compare', 'residues'].includes(operation)
    ? examples.map(({ summary, request, answer: given }) => ({ operation, summary, request, given }))
    : [],
);

test.each(singles)('what the documentation shows for “$summary” is what the engine answers', (example) => {
  const question = { kind: example.operation, body: example.request } as ComputeRequest;
  expect(answer(question, unlimited)).toEqual({ status: 200, answer: example.given });
});

test('so it is for many comparisons', () => {
  for (const { request, answer: given } of compareManyContract.examples) {
    const { compares } = compareManyRequest.parse(request);
    const answers = compares.map((body) => answer({ kind: 'compare', body: compareRequest.parse(body) }, unlimited));
    expect(given).toEqual({ engine: engineVersion, answers });
  }
});
