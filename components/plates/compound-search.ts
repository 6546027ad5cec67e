import type { ComboboxSearch } from '@/components/ui/use-combobox';
import { api } from '@/lib/http/client';

type Row = { id: string; name: string; cas: string | null };

/** Looks compounds up by name, synonym or CAS number. */
export const compoundSearch: ComboboxSearch = async (query) => {
  const address = `/api/v1/compounds?limit=12${query ? `&q=${encodeURIComponent(query)}` : ''}`;
  const { items } = await api<{ items: Row[] }>(address);
  return items.map(({ id, name, cas }) => ({ value: id, label: name, ...(cas && { detail: `CAS ${cas}` }) }));
};
