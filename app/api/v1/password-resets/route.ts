import { z } from 'zod';
import { askPasswordReset } from '@/lib/accounts/reset-password';
import { askResetBody } from '@/lib/accounts/schema';
import { route } from '@/lib/http/route';

export const POST = route({
  summary: 'Ask for a reset link by e-mail; the answer is the same for every address',
  access: 'public',
  body: askResetBody,
  status: 202,
  response: z.object({ detail: z.string() }),
  handle: async ({ body }) => {
    await askPasswordReset(body.email);
    return { json: { detail: 'If there is an account with this address, a link is on its way to it.' } };
  },
});
