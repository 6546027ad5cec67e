/** What kinds of evidence files there are, which types of bytes each may be, and how large. Pure facts. */
export const evidenceKinds = ['plate-photo', 'gc-trace', 'document'] as const;
export type EvidenceKind = (typeof evidenceKinds)[number];

const megabyte = 1024 * 1024;

type KindFacts = {
  /** The word for people. */
  word: string;
  mediaTypes: readonly string[];
  maxBytes: number;
};

const heicTypes = ['image/heic', 'image/heif'] as const;
const photoTypes = ['image/jpeg', 'image/png', 'image/webp', 'image/tiff', ...heicTypes] as const;
const tableTypes = ['text/csv', 'text/tab-separated-values'] as const;

export const kindFacts: Record<EvidenceKind, KindFacts> = {
  'plate-photo': { word: 'plate photo', mediaTypes: photoTypes, maxBytes: 60 * megabyte },
  'gc-trace': {
    word: 'GC trace',
    mediaTypes: [...tableTypes, 'chemical/x-jcamp-dx', 'application/x-netcdf'],
    maxBytes: 200 * megabyte,
  },
  // A photo of a label or a printed table of readings may be kept as a document too.
  document: {
    word: 'document',
    mediaTypes: ['application/pdf', 'text/plain', ...photoTypes, ...tableTypes],
    maxBytes: 100 * megabyte,
  },
};

/** The most that any kind may have, for stopping a stream whose kind is not known yet. */
export const largestBytes = Math.max(...Object.values(kindFacts).map((facts) => facts.maxBytes));

export const whatWeTake =
  'Heartcut takes photos (JPEG, PNG, WebP, TIFF, HEIC), traces (CSV, TSV, JCAMP-DX, netCDF) and documents (PDF, plain text).';

export function isPhotoType(mediaType: string): boolean {
  return (photoTypes as readonly string[]).includes(mediaType);
}

/** Photos that have to be decoded before anything else can open them. */
export function isHeicType(mediaType: string): boolean {
  return (heicTypes as readonly string[]).includes(mediaType);
}

/** The kind that bytes of this type are unless the sender says otherwise; null for a type that is not taken. */
export function usualKindOf(mediaType: string): EvidenceKind | null {
  return evidenceKinds.find((kind) => kindFacts[kind].mediaTypes.includes(mediaType)) ?? null;
}

export function mayBeKind(mediaType: string, kind: EvidenceKind): boolean {
  return kindFacts[kind].mediaTypes.includes(mediaType);
}

/** A size for people: "3.2 MB". */
export function sizeText(bytes: number): string {
  if (bytes < 1000) return `${bytes} bytes`;
  if (bytes < 1_000_000) return `${(bytes / 1000).toFixed(0)} kB`;
  return `${(bytes / 1_000_000).toFixed(1)} MB`;
}
