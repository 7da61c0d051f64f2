import { notFound } from '@/lib/http/respond';
import { guarded } from '@/lib/http/route';

const nothing = guarded(async (request, headers) => notFound(new URL(request.url).pathname, headers));

export {
  nothing as GET,
  nothing as HEAD,
  nothing as POST,
  nothing as PUT,
  nothing as PATCH,
  nothing as DELETE,
  nothing as OPTIONS,
};
