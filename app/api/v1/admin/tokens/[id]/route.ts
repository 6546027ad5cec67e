import { z } from 'zod';
import { route } from '@/lib/http/route';
import { revokeToken } from '@/lib/instruments/create-token';

export const DELETE = route({
  summary: 'Revoke an access token; it is refused from now on',
  params: z.object({ id: z.uuid() }),
  status: 204,
  handle: async ({ actor, params }) => {
    await revokeToken(actor, params.id);
    return { json: null };
  },
});
