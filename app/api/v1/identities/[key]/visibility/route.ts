import { showIdentityContract } from '@/lib/contracts/identities';
import { memberOf } from '@/lib/http/member-of';
import { route } from '@/lib/http/route';
import { changeVisibility } from '@/lib/register/visibility';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = route(showIdentityContract, {
  serve: ({ caller, params, body }) => changeVisibility(memberOf(caller), params.key, body.visibility),
  cost: () => 1,
});
