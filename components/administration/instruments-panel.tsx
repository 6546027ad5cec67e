'use client';
import { DataTable } from '@/components/ui/data-table';
import { Field } from '@/components/ui/field';
import { Select } from '@/components/ui/select';
import { api } from '@/lib/http/client';
import type { PresentedInstrument } from '@/lib/instruments/schema';
import { FormDialog } from './form-dialog';
import type { PresentedGroup } from './people-panel';
import { useList } from './use-list';

export function InstrumentsPanel() {
  const instruments = useList<PresentedInstrument>('/api/v1/admin/instruments');
  const groups = useList<PresentedGroup>('/api/v1/admin/groups');
  async function create(form: FormData) {
    const text = (name: string) => String(form.get(name) ?? '').trim();
    await api('/api/v1/admin/instruments', {
      json: {
        group: text('group'),
        name: text('name'),
        kind: text('kind'),
        ...(text('serialNumber') && { serialNumber: text('serialNumber') }),
        ...(text('place') && { place: text('place') }),
      },
    });
    await instruments.refresh();
  }
  return (
    <section aria-labelledby="instruments">
      <div className="mb-3 flex flex-wrap items-center justify-between gap-3">
        <h2 id="instruments" className="text-lg">
          Instruments
        </h2>
        <FormDialog title="Add an instrument" confirmLabel="Add it" onSend={create}>
          {(errors) => (
            <>
              <Select
                label="Group"
                name="group"
                required
                placeholder="Choose"
                options={groups.items.map((group) => ({ value: group.id, label: group.name }))}
                error={errors.group}
              />
              <Field
                label="Name"
                name="name"
                hint="As it stands on the instrument."
                required
                error={errors.name}
              />
              <Field
                label="Kind"
                name="kind"
                hint="Such as gas chromatograph."
                required
                error={errors.kind}
              />
              <Field label="Serial number" name="serialNumber" optional error={errors.serialNumber} />
              <Field label="Place" name="place" optional error={errors.place} />
            </>
          )}
        </FormDialog>
      </div>
      <DataTable
        caption="Instruments"
        captionHidden
        rows={instruments.items}
        rowKey={(instrument) => instrument.id}
        empty={
          <p>
            {instruments.loading
              ? 'Fetching the instruments.'
              : 'No instrument yet. Add one, then make a token for its PC.'}
          </p>
        }
        columns={[
          { key: 'name', header: 'Name', rowHeader: true, cell: (instrument) => instrument.name },
          { key: 'kind', header: 'Kind', cell: (instrument) => instrument.kind },
          { key: 'group', header: 'Group', cell: (instrument) => instrument.groupName },
          { key: 'place', header: 'Place', cell: (instrument) => instrument.place ?? 'not noted' },
        ]}
      />
    </section>
  );
}
