import { withdrawIdentityContract } from '@/lib/contracts/identities';
import { memberOf } from '@/lib/http/member-of';
import { route } from '@/lib/http/route';
import { withdrawIdentity } from '@/lib/register/withdraw';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = route(withdrawIdentityContract, {
  serve: ({ caller, params, body }) => withdrawIdentity(memberOf(caller), params.key, body),
  cost: () => 1,
});
