import { DataTable } from '@/components/ui/data-table';
import type { FractionSheet } from '@/lib/acceptance/fraction-sheet-schema';

type File = FractionSheet['evidence'][number];

function sizeText(bytes: number): string {
  return bytes < 1_000_000 ? `${(bytes / 1000).toFixed(1)} kB` : `${(bytes / 1_000_000).toFixed(1)} MB`;
}

/** The original files with their digests; `linked` offers their bytes. */
export function SheetFiles({ files, linked = true }: { files: File[]; linked?: boolean }) {
  return (
    <DataTable
      caption="Original files, kept as they came"
      columns={[
        {
          key: 'name',
          header: 'File',
          rowHeader: true,
          cell: (file: File) =>
            linked ? (
              <a href={`/api/v1/evidence/${file.id}/content`} className="link break-all">
                {file.fileName}
              </a>
            ) : (
              <span className="break-all">{file.fileName}</span>
            ),
        },
        { key: 'kind', header: 'Kind', cell: (file) => file.kind },
        { key: 'size', header: 'Size', numeric: true, cell: (file) => sizeText(file.sizeBytes) },
        { key: 'by', header: 'Sent by', cell: (file) => file.sentBy.name },
        {
          key: 'sha256',
          header: 'SHA-256',
          cell: (file) => <span className="font-mono text-xs break-all">{file.sha256}</span>,
        },
      ]}
      rows={files}
      rowKey={(file) => file.id}
      empty={<p className="text-ink-soft">No file yet.</p>}
    />
  );
}
