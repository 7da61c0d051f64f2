import { compareContract } from '@/lib/contracts/compare';
import { computeRoute } from '@/lib/http/compute-route';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = computeRoute('compare', compareContract);
