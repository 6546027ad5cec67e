import { z } from 'zod';
import { createGroup } from '@/lib/accounts/create-group';
import { listGroups } from '@/lib/accounts/list-users';
import { createGroupBody, groupSchema } from '@/lib/accounts/schema';
import { route } from '@/lib/http/route';

export const GET = route({
  summary: 'All groups',
  response: z.object({ items: z.array(groupSchema), nextCursor: z.null() }),
  handle: async ({ actor }) => {
    const groups = await listGroups(actor);
    return {
      json: { items: groups.map(({ id, name, version }) => ({ id, name, version })), nextCursor: null },
    };
  },
});

export const POST = route({
  summary: 'Make a group',
  body: createGroupBody,
  status: 201,
  response: groupSchema,
  handle: async ({ actor, body }) => {
    const { id, name, version } = await createGroup(actor, body.name);
    return { json: { id, name, version } };
  },
});
