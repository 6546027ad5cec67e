import { z } from 'zod';
import { changeUser } from '@/lib/accounts/change-user';
import { presentUser, requireUser } from '@/lib/accounts/list-users';
import { changeUserBody, userSchema } from '@/lib/accounts/schema';
import { route } from '@/lib/http/route';
import { entityTag, requireIfMatch } from '@/lib/http/version';

const params = z.object({ id: z.uuid() });

export const GET = route({
  summary: 'One account with its roles',
  params,
  response: userSchema,
  handle: async ({ actor, params }) => {
    const user = await requireUser(actor, params.id);
    return { json: presentUser(user), headers: { etag: entityTag(user) } };
  },
});

export const PATCH = route({
  summary: 'Change name, admin flag or roles, or disable the account; a reason is needed',
  params,
  body: changeUserBody,
  response: userSchema,
  handle: async ({ actor, params, body, request }) => {
    await changeUser(actor, params.id, requireIfMatch(request), body);
    const user = await requireUser(actor, params.id);
    return { json: presentUser(user), headers: { etag: entityTag(user) } };
  },
});
