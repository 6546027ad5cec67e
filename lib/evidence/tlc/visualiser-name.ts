import { VISUALISERS } from './visualisers';

const other: Record<string, string> = {
  uv: 'uv-254',
  uv254nm: 'uv-254',
  i2: 'iodine',
  kmno4: 'permanganate',
  anisaldehyde: 'p-anisaldehyde',
  pma: 'phosphomolybdic-acid',
  dnp: 'dinitrophenylhydrazine',
  dnph: 'dinitrophenylhydrazine',
  fecl3: 'ferric-chloride',
};

const plain = (text: string) => text.toLowerCase().replace(/[^a-z0-9]/g, '');

/** The id of a visualiser however it was written ("UV 254 nm", "KMnO4"); the text as given when it is none of ours. */
export function visualiserId(text: string): string {
  const wanted = plain(text);
  const known = VISUALISERS.find((one) => plain(one.id) === wanted || plain(one.name) === wanted);
  return known?.id ?? other[wanted] ?? text;
}

/** The name for people. */
export function visualiserName(id: string): string {
  return VISUALISERS.find((one) => one.id === id)?.name ?? id;
}
