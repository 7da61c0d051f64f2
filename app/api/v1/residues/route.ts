import { residuesContract } from '@/lib/contracts/residues';
import { computeRoute } from '@/lib/http/compute-route';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = computeRoute('residues', residuesContract);
