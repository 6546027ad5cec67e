import { z } from 'zod';
import { readHealth } from '@/lib/server/health';
import { route } from '@/lib/http/route';

const service = z.enum(['ok', 'away']);

export const GET = route({
  summary: 'Whether the database, the object store and the mail server answer',
  access: 'public',
  whilePasswordChangeDue: true,
  response: z.object({
    status: service,
    database: service,
    storage: service,
    mail: service,
    version: z.string(),
  }),
  handle: async () => {
    const health = await readHealth();
    return {
      status: health.status === 'ok' ? 200 : 503,
      json: health,
      headers: { 'cache-control': 'no-store' },
    };
  },
});
