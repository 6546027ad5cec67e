'use client';
import { Checkbox } from '@/components/ui/checkbox';
import { roles } from '@/lib/accounts/schema';

type Given = { group: string; role: string };

/** One checkbox a role and group. Named `role:<group>:<role>`, read back by readRoles. */
export function RoleFields({
  groups,
  given = [],
}: {
  groups: { id: string; name: string }[];
  given?: Given[];
}) {
  return (
    <>
      {groups.map((group) => (
        <fieldset key={group.id}>
          <legend className="font-bold">{group.name}</legend>
          <div className="flex flex-wrap gap-x-6">
            {roles.map((role) => (
              <Checkbox
                key={role}
                label={role === 'pi' ? 'PI' : role}
                name={`role:${group.id}:${role}`}
                defaultChecked={given.some((g) => g.group === group.id && g.role === role)}
              />
            ))}
          </div>
        </fieldset>
      ))}
    </>
  );
}

export function readRoles(form: FormData): Given[] {
  return [...form.keys()]
    .map((name) => name.split(':'))
    .filter(([kind]) => kind === 'role')
    .map(([, group, role]) => ({ group: group ?? '', role: role ?? '' }));
}
