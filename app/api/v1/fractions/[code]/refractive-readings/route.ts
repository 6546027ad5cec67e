import { codeParams } from '@/lib/distillation/quantities';
import { addRefractiveReading } from '@/lib/evidence/refractive-index/add-refractive-reading';
import { listRefractiveReadings } from '@/lib/evidence/refractive-index/queries';
import {
  newRefractiveReadingSchema,
  refractiveReadingListQuery,
  refractiveReadingPageSchema,
  refractiveReadingSchema,
} from '@/lib/evidence/refractive-index/schema';
import { route } from '@/lib/http/route';

export const GET = route({
  summary: 'Refractometer readings of a fraction, the newest first',
  params: codeParams,
  query: refractiveReadingListQuery,
  response: refractiveReadingPageSchema,
  handle: async ({ actor, params, query }) => ({
    json: await listRefractiveReadings(actor, params.code, query),
  }),
});

export const POST = route({
  summary: 'Enter refractometer readings; they are corrected and compared with the literature',
  token: 'readings:write',
  params: codeParams,
  body: newRefractiveReadingSchema,
  status: 201,
  response: refractiveReadingSchema,
  handle: async ({ actor, params, body }) => ({ json: await addRefractiveReading(actor, params.code, body) }),
});
