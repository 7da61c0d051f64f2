import { version } from '@/package.json';
import { declined } from '@/lib/compute/request';
import { healthContract } from '@/lib/contracts/health';
import { problemOf } from '@/lib/contracts/problem';
import { pingDatabase } from '@/lib/database/connection';
import { route } from '@/lib/http/route';

export const dynamic = 'force-dynamic';

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = route(healthContract, {
  serve: async () => {
    try {
      await pingDatabase();
      return { status: 200, answer: { status: 'ok', database: 'ok', version } };
    } catch {
      return declined(problemOf('database', 'The database does not answer.'));
    }
  },
  cost: () => 0,
});
