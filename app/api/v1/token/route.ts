import { tokenContract } from '@/lib/contracts/token';
import { route } from '@/lib/http/route';
import { describeToken } from '@/lib/tokens/describe';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = route(tokenContract, {
  serve: ({ caller }) => Promise.resolve(describeToken(caller)),
  cost: () => 0,
});
