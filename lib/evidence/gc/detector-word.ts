/** Detectors by the words that instruments write, in the order in which they are looked for. */
const words: [RegExp, string][] = [
  [/\bfid\b|flame ioni[sz]ation/i, 'FID'],
  [/\btcd\b|\bwld\b|thermal conductivity/i, 'TCD'],
  [/\bms(d)?\b|\btic\b|total ion|mass spec/i, 'MS'],
  [/\becd\b|electron capture/i, 'ECD'],
  [/\bnpd\b/i, 'NPD'],
  [/\bfpd\b/i, 'FPD'],
];

/** The detector that a file name or a heading names, or null. Underscores and the like part words as blanks do. */
export function detectorNamedIn(...texts: string[]): string | null {
  for (const text of texts) {
    const parted = text.replace(/[_\-./\d]+/g, ' ');
    const found = words.find(([pattern]) => pattern.test(parted));
    if (found) return found[1];
  }
  return null;
}

/** What is taken where nothing tells the detector: the usual one, and the most careful, as it sees no water. */
export const assumedDetector = 'FID';
