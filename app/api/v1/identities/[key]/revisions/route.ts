import { reviseIdentityContract } from '@/lib/contracts/identities';
import { memberOf } from '@/lib/http/member-of';
import { route } from '@/lib/http/route';
import { reviseIdentity } from '@/lib/register/revise';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = route(reviseIdentityContract, {
  serve: ({ caller, params, body }, signal) => reviseIdentity(memberOf(caller), params.key, body, { signal }),
  cost: () => 1,
});
