import 'server-only';
import { warmPool } from '@/lib/compute/pool';
import { markAddresses } from './address';

/** What has to stand before the first request is served. */
export function prepareServing(): void {
  markAddresses();
  warmPool();
}
