import { z } from 'zod';
import { route } from '@/lib/http/route';
import { createToken } from '@/lib/instruments/create-token';
import { listTokens, presentToken } from '@/lib/instruments/list-instruments';
import { createTokenBody, newTokenSchema, tokenSchema } from '@/lib/instruments/schema';

export const GET = route({
  summary: 'All access tokens, without their secrets',
  response: z.object({ items: z.array(tokenSchema), nextCursor: z.null() }),
  handle: async ({ actor }) => ({ json: { items: await listTokens(actor), nextCursor: null } }),
});

export const POST = route({
  summary: 'Make an access token for an instrument; the secret is in this answer only',
  body: createTokenBody,
  status: 201,
  response: newTokenSchema,
  handle: async ({ actor, body }) => {
    const { token, row } = await createToken(actor, body);
    return { json: { ...presentToken(row), token } };
  },
});
