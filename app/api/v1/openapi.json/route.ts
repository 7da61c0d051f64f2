import { openApiContract } from '@/lib/contracts/openapi';
import { route } from '@/lib/http/route';
import { describeApi } from '@/lib/openapi/service';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = route(openApiContract, {
  serve: async () => ({ status: 200, answer: describeApi() }),
  cost: () => 0,
});
