import { codeParams } from '@/lib/distillation/quantities';
import { route } from '@/lib/http/route';
import { createShare } from '@/lib/signoff/create-share';
import { revokeShare } from '@/lib/signoff/revoke-share';
import {
  madeShareSchema,
  newShareSchema,
  revokeShareQuery,
  shareListSchema,
} from '@/lib/signoff/share-schema';
import { listShares } from '@/lib/signoff/shares';

export const GET = route({
  summary: 'Read-only links of a fraction, without their tokens',
  params: codeParams,
  response: shareListSchema,
  handle: async ({ actor, params }) => ({
    json: { items: await listShares(actor, params.code), nextCursor: null },
  }),
});

export const POST = route({
  summary: 'Make an expiring, read-only link to a signed-off fraction; the token is shown this once',
  params: codeParams,
  body: newShareSchema,
  response: madeShareSchema,
  status: 201,
  handle: async ({ actor, params, body }) => ({ json: await createShare(actor, params.code, body) }),
});

export const DELETE = route({
  summary: 'Revoke a link, by ?id=',
  params: codeParams,
  query: revokeShareQuery,
  status: 204,
  handle: async ({ actor, params, query }) => {
    await revokeShare(actor, params.code, query.id);
    return { json: null };
  },
});
