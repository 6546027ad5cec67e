import { z } from 'zod';
import { route } from '@/lib/http/route';
import { createInstrument } from '@/lib/instruments/create-instrument';
import { listInstruments } from '@/lib/instruments/list-instruments';
import { createInstrumentBody, instrumentSchema } from '@/lib/instruments/schema';

export const GET = route({
  summary: 'All instruments',
  response: z.object({ items: z.array(instrumentSchema), nextCursor: z.null() }),
  handle: async ({ actor }) => ({ json: { items: await listInstruments(actor), nextCursor: null } }),
});

export const POST = route({
  summary: 'Add an instrument to a group',
  body: createInstrumentBody,
  status: 201,
  response: z.object({ id: z.string(), name: z.string() }),
  handle: async ({ actor, body }) => {
    const { id, name } = await createInstrument(actor, body);
    return { json: { id, name } };
  },
});
