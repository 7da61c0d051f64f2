import { createIdentityContract, listIdentitiesContract } from '@/lib/contracts/identities';
import { memberOf } from '@/lib/http/member-of';
import { address, bind } from '@/lib/http/route';
import { keepIdentity } from '@/lib/register/keep';
import { listIdentities } from '@/lib/register/list';

const list = bind(listIdentitiesContract, {
  serve: ({ caller, query }) => listIdentities(memberOf(caller), query),
  cost: () => 1,
});

const keep = bind(createIdentityContract, {
  serve: ({ caller, body, idempotencyKey }, signal) => keepIdentity(memberOf(caller), body, { idempotencyKey, signal }),
  cost: () => 1,
});

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = address(list, keep);
