import { addReadings } from '@/lib/distillation/add-readings';
import { listReadings } from '@/lib/distillation/list-readings';
import { codeParams } from '@/lib/distillation/quantities';
import {
  newReadingsSchema,
  readingListQuery,
  readingPageSchema,
  readingsAddedSchema,
} from '@/lib/distillation/reading-schema';
import { route } from '@/lib/http/route';

export const GET = route({
  summary: 'Log readings of a run, in the order of their times',
  params: codeParams,
  query: readingListQuery,
  response: readingPageSchema,
  handle: async ({ actor, params, query }) => ({ json: await listReadings(actor, params.code, query) }),
});

export const POST = route({
  summary: 'Add log readings, one or up to 10,000; also by a token with readings:write',
  token: 'readings:write',
  params: codeParams,
  body: newReadingsSchema,
  response: readingsAddedSchema,
  status: 201,
  handle: async ({ actor, params, body }) => ({
    json: await addReadings(actor, params.code, body.readings),
  }),
});
