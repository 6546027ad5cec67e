'use client';
import { buttonClass } from '@/components/ui/button-class';
import { useCompoundName } from './browse-filters';
import { filterLabels, filterNames, type FilterName, type Filters } from './browse-filters-state';

type BrowseChipsProps = {
  filters: Filters;
  groups: readonly { id: string; name: string }[];
  onClear: (name: FilterName) => void;
  onClearAll: () => void;
};

/** The filters that are on, each with a press to take it off. */
export function BrowseChips({ filters, groups, onClear, onClearAll }: BrowseChipsProps) {
  const compound = useCompoundName(filters.compound);
  const on = filterNames.filter((name) => filters[name]);
  if (on.length === 0) return null;
  const shown = (name: FilterName) => {
    if (name === 'compound') return compound ?? 'chosen compound';
    if (name === 'group') return groups.find((group) => group.id === filters.group)?.name ?? 'chosen group';
    return `${filters[name]}${name === 'purityMin' ? ' %' : ''}`;
  };
  return (
    <ul aria-label="Filters that are on" className="flex flex-wrap gap-2">
      {on.map((name) => (
        <li key={name}>
          <button
            type="button"
            className={buttonClass('secondary', 'font-normal')}
            onClick={() => onClear(name)}
          >
            <span>
              {filterLabels[name]}: <strong>{shown(name)}</strong>
            </span>
            <span aria-hidden="true">×</span>
            <span className="sr-only">, take this filter off</span>
          </button>
        </li>
      ))}
      {on.length > 1 ? (
        <li>
          <button type="button" className={buttonClass('quiet')} onClick={onClearAll}>
            Clear all
          </button>
        </li>
      ) : null}
    </ul>
  );
}
