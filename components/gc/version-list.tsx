'use client';
import { LocalTime } from '@/components/runs/local-time';
import { Button } from '@/components/ui/button';
import type { IntegrationRow } from '@/lib/evidence/gc/schema';

type VersionListProps = {
  versions: readonly IntegrationRow[];
  shownId: string;
  onShow: (id: string) => void;
};

/** Every version of the integration, the newest first; none is ever changed. */
export function VersionList({ versions, shownId, onShow }: VersionListProps) {
  return (
    <ol className="flex flex-col gap-2">
      {versions.map((version) => (
        <li
          key={version.id}
          aria-current={version.id === shownId || undefined}
          className={`flex flex-wrap items-center justify-between gap-3 rounded border px-3 py-2 ${
            version.id === shownId ? 'border-glass bg-glass-wash' : 'border-line bg-paper-raised'
          }`}
        >
          <div className="min-w-0">
            <p className="font-bold">
              Version {version.version}
              {version.inForce ? ', in force' : ''}
            </p>
            <p>{version.reason ?? 'First integration, with the usual parameters.'}</p>
            <p className="text-sm text-ink-soft">
              {version.author}, <LocalTime at={version.createdAt} />, {version.peakCount}{' '}
              {version.peakCount === 1 ? 'peak' : 'peaks'}
            </p>
          </div>
          {version.id === shownId ? (
            <span className="text-sm text-ink-soft">shown above</span>
          ) : (
            <Button onClick={() => onShow(version.id)}>Look at version {version.version}</Button>
          )}
        </li>
      ))}
    </ol>
  );
}
