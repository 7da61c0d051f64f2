import { compareContract } from '@/lib/contracts/compare';
import { compareManyContract } from '@/lib/contracts/compare-many';
import type { AnyContract } from '@/lib/contracts/contract';
import { healthContract } from '@/lib/contracts/health';
import { normalizeContract } from '@/lib/contracts/normalize';
import { openApiContract } from '@/lib/contracts/openapi';
import { residuesContract } from '@/lib/contracts/residues';

/** Every call of the API, in the order in which the documentation lists them. */
export const contracts: readonly AnyContract[] = [
  normalizeContract,
  compareContract,
  compareManyContract,
  residuesContract,
  healthContract,
  openApiContract,
];
