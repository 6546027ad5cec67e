'use client';
import useSWR from 'swr';
import { searchCompounds } from '@/components/runs/compound-search';
import { Combobox } from '@/components/ui/combobox';
import { Field } from '@/components/ui/field';
import { Select } from '@/components/ui/select';
import type { CompoundRow } from '@/lib/compounds/schema';
import { verdictStates } from '@/lib/distillation/fraction-schema';
import { cuts, fractionStatuses } from '@/lib/distillation/fraction-states';
import { fetcher } from '@/lib/http/client';
import type { FilterName, Filters } from './browse-filters-state';
import { TypedFilter } from './browse-typed-filter';

type BrowseFiltersProps = {
  filters: Filters;
  groups: readonly { id: string; name: string }[];
  onChange: (name: FilterName, value: string) => void;
};

const isId = (text: string | undefined) => text !== undefined && /^[0-9a-f-]{36}$/i.test(text);
const choices = (values: readonly string[]) => values.map((value) => ({ value, label: value }));

/** The name of the compound that the address holds by id; the text itself where it holds a name. */
export function useCompoundName(compound: string | undefined): string | null {
  const { data } = useSWR(isId(compound) ? `/api/v1/compounds/${compound}` : null, fetcher<CompoundRow>);
  if (compound === undefined) return null;
  return isId(compound) ? (data?.name ?? null) : compound;
}

/** Every filter of the list. A choice takes effect at once, a typed text after a short pause. */
export function BrowseFilters({ filters, groups, onChange }: BrowseFiltersProps) {
  const compound = useCompoundName(filters.compound);
  const chosen = filters.compound && compound ? { value: filters.compound, label: compound } : null;
  const select = (name: FilterName, label: string, values: readonly { value: string; label: string }[]) => (
    <Select
      label={label}
      value={filters[name] ?? ''}
      placeholder="any"
      options={values}
      onChange={(event) => onChange(name, event.target.value)}
    />
  );
  const date = (name: FilterName, label: string) => (
    <Field
      label={label}
      type="date"
      value={filters[name]?.slice(0, 10) ?? ''}
      onChange={(event) => onChange(name, event.target.value)}
    />
  );
  return (
    <div className="grid gap-3 sm:grid-cols-2 lg:grid-cols-4">
      <Combobox
        key={chosen ? `${chosen.value} ${chosen.label}` : 'none'}
        label="Compound"
        search={searchCompounds}
        initial={chosen}
        onChoose={(option) => onChange('compound', option?.value ?? '')}
      />
      <TypedFilter
        label="Text"
        hint="Code, look, storage place"
        value={filters.q ?? ''}
        onChange={(value) => onChange('q', value)}
      />
      <TypedFilter
        label="Run"
        hint="Whole code"
        value={filters.run ?? ''}
        onChange={(value) => onChange('run', value)}
      />
      <TypedFilter
        label="Purity from"
        hint="GC area, %"
        value={filters.purityMin ?? ''}
        onChange={(value) => onChange('purityMin', value.replace(',', '.'))}
      />
      {select('cut', 'Cut', choices(cuts))}
      {select('status', 'Status', choices(fractionStatuses))}
      {select('verdict', 'Verdict', choices(verdictStates))}
      {groups.length > 1
        ? select(
            'group',
            'Group',
            groups.map(({ id, name }) => ({ value: id, label: name })),
          )
        : null}
      {date('collectedFrom', 'Collected from')}
      {date('collectedTo', 'Collected until')}
    </div>
  );
}
