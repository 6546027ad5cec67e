'use client';
import { useState } from 'react';
import { Checkbox } from '@/components/ui/checkbox';
import { DataTable } from '@/components/ui/data-table';
import { Field } from '@/components/ui/field';
import type { groupSchema, PresentedUser } from '@/lib/accounts/schema';
import { api } from '@/lib/http/client';
import type { z } from 'zod';
import { ChangePerson } from './change-person';
import { FormDialog } from './form-dialog';
import { readRoles, RoleFields } from './role-fields';
import { SecretNotice } from './secret-notice';
import { useList } from './use-list';

export type PresentedGroup = z.infer<typeof groupSchema>;

function rolesInWords(user: PresentedUser): string {
  const words = user.memberships.map((m) => `${m.role} in ${m.groupName}`);
  if (user.isAdmin) words.push('administrator');
  return words.join(', ') || 'none';
}

function stateInWords(user: PresentedUser): string {
  if (user.disabledAt) return 'disabled';
  return user.mustChangePassword ? 'first password not changed yet' : 'in use';
}

export function PeoplePanel() {
  const people = useList<PresentedUser>('/api/v1/admin/users?limit=200');
  const groups = useList<PresentedGroup>('/api/v1/admin/groups');
  const [made, setMade] = useState<{ email: string; firstPassword: string } | null>(null);
  async function create(form: FormData) {
    const email = String(form.get('email'));
    const json = {
      email,
      name: String(form.get('name')),
      isAdmin: form.get('isAdmin') === 'on',
      memberships: readRoles(form),
    };
    const { firstPassword } = await api<{ firstPassword: string }>('/api/v1/admin/users', { json });
    setMade({ email, firstPassword });
    await people.refresh();
  }
  return (
    <section aria-labelledby="people">
      <div className="mb-3 flex flex-wrap items-center justify-between gap-3">
        <h2 id="people" className="text-lg">
          People
        </h2>
        <FormDialog title="Make an account" confirmLabel="Make it" onSend={create}>
          {(errors) => (
            <>
              <Field
                label="Name"
                name="name"
                hint="As signatures will show it."
                required
                error={errors.name}
              />
              <Field label="E-mail" name="email" type="email" required error={errors.email} />
              <RoleFields groups={groups.items} />
              <Checkbox
                label="Administrator: accounts, instruments, tokens; no rights in groups by itself"
                name="isAdmin"
              />
            </>
          )}
        </FormDialog>
      </div>
      {made ? (
        <SecretNotice
          title={`First password of ${made.email}`}
          secret={made.firstPassword}
          onClose={() => setMade(null)}
        >
          Give it to the person by a safe way. It is shown once and must be changed at the first sign-in.
        </SecretNotice>
      ) : null}
      <DataTable
        caption="Accounts"
        captionHidden
        rows={people.items}
        rowKey={(user) => user.id}
        empty={
          <p>{people.loading ? 'Fetching the accounts.' : (people.failed?.message ?? 'No account yet.')}</p>
        }
        columns={[
          { key: 'name', header: 'Name', rowHeader: true, cell: (user) => user.name },
          { key: 'email', header: 'E-mail', cell: (user) => <span className="break-all">{user.email}</span> },
          { key: 'roles', header: 'Roles', cell: rolesInWords },
          { key: 'state', header: 'State', cell: stateInWords },
          {
            key: 'change',
            header: 'Change',
            cell: (user) => (
              <ChangePerson user={user} groups={groups.items} onChanged={() => void people.refresh()} />
            ),
          },
        ]}
      />
    </section>
  );
}
