import { checkIdentityContract } from '@/lib/contracts/identities';
import { memberOf } from '@/lib/http/member-of';
import { route } from '@/lib/http/route';
import { recheckIdentity } from '@/lib/register/recheck';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = route(checkIdentityContract, {
  serve: ({ caller, params }, signal) => recheckIdentity(memberOf(caller), params.key, { signal }),
  cost: () => 1,
});
