import { z } from 'zod';
import { resetPassword } from '@/lib/accounts/reset-password';
import { resetPasswordBody } from '@/lib/accounts/schema';
import { originOf } from '@/lib/auth/current-actor';
import { route } from '@/lib/http/route';

export const POST = route({
  summary: 'Set a new password by the token of a mailed link, once',
  access: 'public',
  params: z.object({ token: z.string().min(20).max(100) }),
  body: resetPasswordBody,
  status: 204,
  handle: async ({ params, body, request }) => {
    await resetPassword(params.token, body.newPassword, originOf(request.headers));
    return { json: null };
  },
});
