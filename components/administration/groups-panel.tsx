'use client';
import { DataTable } from '@/components/ui/data-table';
import { Field } from '@/components/ui/field';
import { api } from '@/lib/http/client';
import { FormDialog } from './form-dialog';
import type { PresentedGroup } from './people-panel';
import { useList } from './use-list';

export function GroupsPanel() {
  const groups = useList<PresentedGroup>('/api/v1/admin/groups');
  async function create(form: FormData) {
    await api('/api/v1/admin/groups', { json: { name: String(form.get('name')) } });
    await groups.refresh();
  }
  return (
    <section aria-labelledby="groups">
      <div className="mb-3 flex flex-wrap items-center justify-between gap-3">
        <h2 id="groups" className="text-lg">
          Groups
        </h2>
        <FormDialog title="Make a group" confirmLabel="Make it" onSend={create}>
          {(errors) => (
            <Field
              label="Name"
              name="name"
              hint="Its records are seen by its members only."
              required
              error={errors.name}
            />
          )}
        </FormDialog>
      </div>
      <DataTable
        caption="Groups"
        captionHidden
        rows={groups.items}
        rowKey={(group) => group.id}
        empty={
          <p>
            {groups.loading
              ? 'Fetching the groups.'
              : 'No group yet. Make the first one; accounts get their roles in groups.'}
          </p>
        }
        columns={[
          { key: 'name', header: 'Name', rowHeader: true, cell: (group) => group.name },
          {
            key: 'id',
            header: 'Id',
            cell: (group) => <span className="font-mono text-sm break-all">{group.id}</span>,
          },
        ]}
      />
    </section>
  );
}
