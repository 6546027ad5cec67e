import { changePassword } from '@/lib/accounts/change-password';
import { changePasswordBody } from '@/lib/accounts/schema';
import { requirePerson } from '@/lib/auth/require-person';
import { route } from '@/lib/http/route';

export const POST = route({
  summary: 'Change your own password; every sign-in of the account ends',
  whilePasswordChangeDue: true,
  body: changePasswordBody,
  status: 204,
  handle: async ({ actor, body }) => {
    await changePassword(requirePerson(actor), body.currentPassword, body.newPassword);
    return { json: null };
  },
});
