'use client';
import { Checkbox } from '@/components/ui/checkbox';
import { Field } from '@/components/ui/field';
import type { PresentedUser } from '@/lib/accounts/schema';
import { api } from '@/lib/http/client';
import { FormDialog } from './form-dialog';
import { readRoles, RoleFields } from './role-fields';

type Props = { user: PresentedUser; groups: { id: string; name: string }[]; onChanged: () => void };

/** Changes name, roles and state of an account, with a reason. It counts from that person's next click. */
export function ChangePerson({ user, groups, onChanged }: Props) {
  async function change(form: FormData) {
    await api(`/api/v1/admin/users/${user.id}`, {
      method: 'PATCH',
      version: user.version,
      json: {
        name: String(form.get('name')),
        isAdmin: form.get('isAdmin') === 'on',
        disabled: form.get('disabled') === 'on',
        memberships: readRoles(form),
        reason: String(form.get('reason')),
      },
    });
    onChanged();
  }
  return (
    <FormDialog title={`Change ${user.name}`} confirmLabel="Save the change" onSend={change}>
      {(errors) => (
        <>
          <Field label="Name" name="name" defaultValue={user.name} required error={errors.name} />
          <RoleFields groups={groups} given={user.memberships} />
          <Checkbox label="Administrator" name="isAdmin" defaultChecked={user.isAdmin} />
          <Checkbox
            label="Disabled"
            name="disabled"
            hint="Cannot sign in; everything this person recorded and signed stays."
            defaultChecked={user.disabledAt !== null}
          />
          <Field
            label="Reason"
            name="reason"
            hint="Kept in the audit trail."
            required
            error={errors.reason}
          />
        </>
      )}
    </FormDialog>
  );
}
