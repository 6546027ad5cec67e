import { z } from 'zod';
import { createUser } from '@/lib/accounts/create-user';
import { listUsers } from '@/lib/accounts/list-users';
import { createUserBody, userSchema } from '@/lib/accounts/schema';
import { pageQuery } from '@/lib/http/paging';
import { route } from '@/lib/http/route';

export const GET = route({
  summary: 'Accounts with their roles',
  query: z.strictObject(pageQuery),
  response: z.object({ items: z.array(userSchema), nextCursor: z.string().nullable() }),
  handle: async ({ actor, query }) => ({ json: await listUsers(actor, query) }),
});

export const POST = route({
  summary: 'Make an account; its first password is shown once and must be changed at the first sign-in',
  body: createUserBody,
  status: 201,
  response: z.object({ id: z.string(), firstPassword: z.string() }),
  handle: async ({ actor, body }) => ({ json: await createUser(actor, body) }),
});
