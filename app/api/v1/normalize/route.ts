import { normalizeContract } from '@/lib/contracts/normalize';
import { computeRoute } from '@/lib/http/compute-route';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = computeRoute('normalize', normalizeContract);
