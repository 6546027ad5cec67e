import { fractionFilters, fractionSorts, type FractionSort } from '@/lib/distillation/fraction-schema';

export const filterNames = [
  'compound',
  'q',
  'run',
  'cut',
  'status',
  'verdict',
  'group',
  'collectedFrom',
  'collectedTo',
  'purityMin',
] as const satisfies readonly (keyof typeof fractionFilters)[];
export type FilterName = (typeof filterNames)[number];
export type Filters = Partial<Record<FilterName, string>>;
export type BrowseState = { filters: Filters; sort: FractionSort };

/** What each filter is called on the page. */
export const filterLabels: Record<FilterName, string> = {
  compound: 'Compound',
  q: 'Text',
  run: 'Run',
  cut: 'Cut',
  status: 'Status',
  verdict: 'Verdict',
  group: 'Group',
  collectedFrom: 'Collected from',
  collectedTo: 'Collected until',
  purityMin: 'Purity from',
};

/**
 * The filters of an address. A value that the API would refuse is left out, so that an old or edited link
 * shows a list rather than an error; what is unknown is ignored.
 */
export function readAddress(search: URLSearchParams): BrowseState {
  const filters: Filters = {};
  for (const name of filterNames) {
    const value = search.get(name);
    if (value && fractionFilters[name].safeParse(value).success) filters[name] = value;
  }
  const sort = fractionSorts.find((each) => each === search.get('sort')) ?? '-collectedAt';
  return { filters, sort };
}

/** The address of a state; what is as by default is left out, so that links stay short. */
export function writeAddress({ filters, sort }: BrowseState): string {
  const search = new URLSearchParams();
  for (const name of filterNames) if (filters[name]) search.set(name, filters[name]);
  if (sort !== '-collectedAt') search.set('sort', sort);
  return search.toString();
}
