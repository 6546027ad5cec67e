import { signOutEverywhere } from '@/lib/accounts/change-password';
import { requirePerson } from '@/lib/auth/require-person';
import { route } from '@/lib/http/route';

export const POST = route({
  summary: 'End every sign-in of your account, on all machines',
  whilePasswordChangeDue: true,
  status: 204,
  handle: async ({ actor }) => {
    await signOutEverywhere(requirePerson(actor));
    return { json: null };
  },
});
