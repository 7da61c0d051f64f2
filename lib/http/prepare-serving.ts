import 'server-only';
import { warmPool } from '@/lib/compute/pool';
import { correctIncoming } from './incoming';

/** What has to stand before the first request is served. */
export function prepareServing(): void {
  correctIncoming();
  warmPool();
}
