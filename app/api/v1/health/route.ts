import { declined, type Reply } from '@/lib/compute/request';
import { type HealthAnswer, healthContract } from '@/lib/contracts/health';
import { problemOf } from '@/lib/contracts/problem';
import { pingDatabase } from '@/lib/database/connection';
import { programVersion } from '@/lib/http/program-version';
import { route } from '@/lib/http/route';

export const dynamic = 'force-dynamic';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = route(healthContract, {
  serve: async (): Promise<Reply<HealthAnswer>> => {
    try {
      await pingDatabase();
      return { status: 200, answer: { status: 'ok', database: 'ok', version: programVersion() } };
    } catch {
      return declined(problemOf('database', 'The database does not answer.'));
    }
  },
  cost: () => 0,
});
