import { compareContract } from '@/lib/contracts/compare';
import { compareManyContract } from '@/lib/contracts/compare-many';
import type { AnyContract } from '@/lib/contracts/contract';
import { healthContract } from '@/lib/contracts/health';
import {
  checkIdentityContract,
  createIdentityContract,
  exportIdentitiesContract,
  listIdentitiesContract,
  readIdentityContract,
  reviseIdentityContract,
  showIdentityContract,
  withdrawIdentityContract,
} from '@/lib/contracts/identities';
import { normalizeContract } from '@/lib/contracts/normalize';
import { openApiContract } from '@/lib/contracts/openapi';
import { residuesContract } from '@/lib/contracts/residues';
import { tokenContract } from '@/lib/contracts/token';

/** Every call of the API, in the order in which the documentation lists them. */
export const contracts: readonly AnyContract[] = [
  normalizeContract,
  compareContract,
  compareManyContract,
  residuesContract,
  listIdentitiesContract,
  createIdentityContract,
  readIdentityContract,
  reviseIdentityContract,
  withdrawIdentityContract,
  checkIdentityContract,
  showIdentityContract,
  exportIdentitiesContract,
  tokenContract,
  healthContract,
  openApiContract,
];
