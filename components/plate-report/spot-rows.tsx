import { type Column, DataTable } from '@/components/ui/data-table';
import type { PlatePhotoView } from '@/lib/evidence/tlc/schema';

type Lane = PlatePhotoView['lanes'][number];
type Row = { key: string; name: string; lane: Lane; spot: Lane['spots'][number] | null };

/** What was spotted on a lane, in words: "fraction D-2026-0042-F3", "reference, ethyl acetate, 1 %". */
export function subjectWords({ subject, dilutionPercent }: Lane): string {
  const parts = [
    subject.code ? `${subject.kind} ${subject.code}` : subject.kind,
    subject.compound?.name,
    dilutionPercent === null ? null : `${dilutionPercent} %`,
  ];
  return parts.filter(Boolean).join(', ');
}

/** Rf of every spot of a photo with its standard uncertainty, and where it lies on the plate. */
export function SpotRows({ photo }: { photo: PlatePhotoView }) {
  const rows = photo.lanes.flatMap((lane): Row[] =>
    lane.spots.length === 0
      ? [{ key: lane.id, name: lane.label, lane, spot: null }]
      : lane.spots.map((spot, s) => ({ key: `${lane.id}-${s}`, name: `${lane.label}.${s + 1}`, lane, spot })),
  );
  const place = ({ spot }: Row) =>
    spot?.plateX == null || spot.plateY === null
      ? '–'
      : `${spot.plateX.toFixed(photo.plateUnit === 'mm' ? 1 : 3)}; ${spot.plateY.toFixed(photo.plateUnit === 'mm' ? 1 : 3)}`;
  const columns: Column<Row>[] = [
    { key: 'name', header: 'Spot', cell: ({ name }) => name, rowHeader: true },
    { key: 'subject', header: 'Lane holds', cell: ({ lane }) => subjectWords(lane) },
    { key: 'rf', header: 'Rf', cell: ({ spot }) => spot?.rf.toFixed(2) ?? 'no spot', numeric: true },
    { key: 'hrf', header: 'hRf', cell: ({ spot }) => spot?.hRf.toFixed(0) ?? '–', numeric: true },
    { key: 'u', header: 'u(Rf)', cell: ({ spot }) => spot?.rfUncertainty.toFixed(3) ?? '–', numeric: true },
    {
      key: 'place',
      header: photo.plateUnit === 'relative' ? 'x; y (shares)' : 'x; y (mm)',
      cell: place,
      numeric: true,
    },
    { key: 'flags', header: 'Flags', cell: ({ spot }) => spot?.flags.join(', ') || '–' },
  ];
  return (
    <DataTable
      caption="Rf with its standard uncertainty (k = 1)"
      columns={columns}
      rows={rows}
      rowKey={(row) => row.key}
    />
  );
}
