import { z } from 'zod';
import { approveSpecification } from '@/lib/acceptance/approve-specification';
import { specificationSchema } from '@/lib/acceptance/specification-schema';
import { route } from '@/lib/http/route';
import { requireIfMatch } from '@/lib/http/version';

export const POST = route({
  summary: 'A PI approves an edition: it is in force from now on. Send its version as If-Match',
  params: z.object({ id: z.uuid() }),
  response: specificationSchema,
  handle: async ({ actor, params, request }) => ({
    json: await approveSpecification(actor, params.id, requireIfMatch(request)),
  }),
});
