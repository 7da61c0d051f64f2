import { afterAll, beforeAll, inject } from 'vitest';
import type {} from './provided';
import { createDatabase, dropDatabase } from './database';

/** Gives a test file a database of its own, dropped when the file is done. Returns its address, known once tests run. */
export function ownDatabase(options: { empty?: boolean } = {}): () => string {
  let url: string | undefined;
  const cluster = () => ({ adminUrl: inject('adminUrl'), template: inject('template') });
  beforeAll(async () => {
    url = await createDatabase(cluster(), options);
  });
  afterAll(async () => {
    if (url !== undefined) await dropDatabase(cluster(), url);
  });
  return () => {
    if (url === undefined) throw new Error('The database is made before the first test, not earlier.');
    return url;
  };
}
