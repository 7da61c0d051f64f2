import { readIdentityContract } from '@/lib/contracts/identities';
import { route } from '@/lib/http/route';
import { answerOf } from '@/lib/register/open';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = route(readIdentityContract, {
  serve: ({ caller, params, query }) => answerOf(caller, params.key, query.revision),
  cost: () => 1,
});
