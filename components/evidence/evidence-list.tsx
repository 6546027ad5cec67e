import type { ReactNode } from 'react';
import { kindFacts, isPhotoType, sizeText } from '@/lib/evidence/kinds';
import type { EvidenceView } from '@/lib/evidence/schema';
import { Photo } from './photo';

type EvidenceListProps = {
  items: readonly EvidenceView[];
  /** Shown when there is nothing. */
  empty?: ReactNode;
  /** What can be done with one: a link or a button. */
  actionFor?: (item: EvidenceView) => ReactNode;
};

/** A sheet of paper with lines, for files that are no pictures. */
function PaperSign() {
  return (
    <svg viewBox="0 0 48 60" aria-hidden="true" className="h-16 text-line-strong">
      <path
        d="M6 3h26l10 10v44H6ZM32 3v10h10M13 24h22M13 33h22M13 42h14"
        fill="none"
        stroke="currentColor"
        strokeWidth="2"
        strokeLinejoin="round"
      />
    </svg>
  );
}

const dateText = (iso: string) => `${iso.slice(0, 10)} ${iso.slice(11, 16)} UTC`;

/** Files with their pictures: kind, size, who sent them, and the original to open. */
export function EvidenceList({ items, empty, actionFor }: EvidenceListProps) {
  if (items.length === 0) return <>{empty ?? <p className="text-ink-soft">No files yet.</p>}</>;
  return (
    <ul className="grid grid-cols-[repeat(auto-fill,minmax(13rem,1fr))] gap-4 max-sm:grid-cols-1">
      {items.map((item) => (
        <li
          key={item.id}
          className="flex flex-col overflow-hidden rounded border border-line bg-paper-raised"
        >
          <div className="flex h-40 items-center justify-center bg-paper-sunk">
            {isPhotoType(item.mediaType) ? (
              <Photo evidence={item} className="h-full w-full object-contain" />
            ) : (
              <PaperSign />
            )}
          </div>
          <div className="flex flex-1 flex-col gap-1 px-3 py-2">
            <p className="font-bold break-all">{item.fileName}</p>
            <p className="text-sm text-ink-soft">
              {kindFacts[item.kind].word}, {sizeText(item.sizeBytes)}
              {item.fraction ? `, ${item.fraction}` : ''}
            </p>
            <p className="text-sm text-ink-soft">
              {item.sentBy.name}, {dateText(item.createdAt)}
            </p>
            <div className="mt-auto flex flex-wrap items-center gap-2 pt-1">
              {actionFor?.(item)}
              <a
                className="link inline-flex min-h-target items-center"
                href={`/api/v1/evidence/${item.id}/content`}
                aria-label={`Open the original of ${item.fileName}`}
              >
                Open the original
              </a>
            </div>
          </div>
        </li>
      ))}
    </ul>
  );
}
