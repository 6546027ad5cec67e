import { presentActor, meSchema } from '@/lib/accounts/present';
import { route } from '@/lib/http/route';

export const GET = route({
  summary: 'The caller, its groups and roles, or the token with its instrument and scopes',
  token: 'any',
  whilePasswordChangeDue: true,
  response: meSchema,
  handle: async ({ actor }) => ({ json: presentActor(actor) }),
});
