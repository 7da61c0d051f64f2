import { compareMany } from '@/lib/compute/many';
import { compareManyContract } from '@/lib/contracts/compare-many';
import { route } from '@/lib/http/route';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = route(compareManyContract, {
  serve: async ({ body: { compares } }, signal) => ({ status: 200, answer: await compareMany(compares, signal) }),
  cost: ({ compares }) => compares.length,
});
