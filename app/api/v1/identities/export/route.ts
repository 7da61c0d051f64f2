import { isAnswer } from '@/lib/compute/request';
import { exportIdentitiesContract } from '@/lib/contracts/identities';
import { memberOf } from '@/lib/http/member-of';
import { route } from '@/lib/http/route';
import { exportIdentities } from '@/lib/register/export';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = route(exportIdentitiesContract, {
  serve: async ({ caller, query }) => {
    const reply = await exportIdentities(memberOf(caller), query);
    return isAnswer(reply) ? { file: reply.answer } : reply;
  },
  cost: () => 1,
});
