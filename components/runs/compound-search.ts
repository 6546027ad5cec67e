import type { ComboboxSearch } from '@/components/ui/use-combobox';
import type { CompoundRow } from '@/lib/compounds/schema';
import { fetcher } from '@/lib/http/client';

/** Compounds by name, synonym, CAS number or formula, for a combobox. */
export const searchCompounds: ComboboxSearch = async (query) => {
  const parameters = new URLSearchParams({ limit: '20', ...(query && { q: query }) });
  const page = await fetcher<{ items: CompoundRow[] }>(`/api/v1/compounds?${parameters}`);
  return page.items.map(({ id, name, cas, formula, synonyms }) => ({
    value: id,
    label: name,
    detail: [cas, formula, synonyms[0]].filter(Boolean).join(' · '),
  }));
};
