'use client';
import { Button } from '@/components/ui/button';
import { Checkbox } from '@/components/ui/checkbox';
import { type Column, DataTable } from '@/components/ui/data-table';
import type { Measured } from '@/lib/evidence/tlc/measure-marks';
import { proposedWords, rfText } from './mark-names';
import type { MarkRef, Marks } from './marks';

type SpotTableProps = {
  marks: Marks;
  measured: Measured | null;
  /** "preview until saved", or whose numbers they are. */
  caption: string;
  still: boolean;
  onShape: (lane: number, spot: number, shape: 'spot' | 'streak') => void;
  onRemove: (ref: MarkRef) => void;
};

type Row = {
  key: string;
  lane: number;
  spot: number;
  label: string;
  x: number;
  y: number;
  streak: boolean;
  proposed: string | null;
};

/** Flags of the whole photo stand once above the table, not in each row. */
const ofPhoto = ['perspective not corrected', 'scale not known'];

/** Every spot in words and numbers: the picture's text twin. */
export function SpotTable({ marks, measured, caption, still, onShape, onRemove }: SpotTableProps) {
  const rows: Row[] = marks.lanes.flatMap((lane, l) =>
    lane.spots.map((spot, s) => ({
      key: `${l}-${s}`,
      lane: l,
      spot: s,
      label: lane.label,
      x: spot.x,
      y: spot.y,
      streak: spot.shape === 'streak',
      proposed: proposedWords(marks, { kind: 'spot', lane: l, spot: s }),
    })),
  );
  const result = (row: Row) => measured?.lanes[row.lane]?.spots[row.spot] ?? null;
  const problem = (row: Row) =>
    measured?.problems.find((one) => one.path === `lanes.${row.lane}.spots.${row.spot}`)?.message ?? null;
  const columns: Column<Row>[] = [
    { key: 'spot', header: 'Spot', rowHeader: true, cell: (row) => `${row.label}, spot ${row.spot + 1}` },
    {
      key: 'rf',
      header: 'Rf ± u',
      numeric: true,
      cell: (row) => {
        const found = result(row);
        if (found) return rfText(found.rf, found.rfUncertainty);
        return measured ? <span className="font-bold text-fails">none</span> : 'set the lines first';
      },
    },
    { key: 'x', header: 'x / px', numeric: true, cell: (row) => row.x.toFixed(0) },
    { key: 'y', header: 'y / px', numeric: true, cell: (row) => row.y.toFixed(0) },
    {
      key: 'flags',
      header: 'Notes',
      cell: (row) => {
        const flags = (result(row)?.flags ?? []).filter((flag) => !ofPhoto.includes(flag));
        const notes = [...(row.proposed ? [row.proposed] : []), ...flags];
        return problem(row) ?? (notes.length ? notes.join(', ') : 'none');
      },
    },
  ];
  if (!still) {
    columns.push(
      {
        key: 'streak',
        header: 'Streak',
        cell: (row) => (
          <Checkbox
            label={<span className="sr-only">{`Lane ${row.label}, spot ${row.spot + 1} is a streak`}</span>}
            checked={row.streak}
            onChange={(event) => onShape(row.lane, row.spot, event.target.checked ? 'streak' : 'spot')}
          />
        ),
      },
      {
        key: 'remove',
        header: 'Remove',
        cell: (row) => (
          <Button
            variant="quiet"
            aria-label={`Remove lane ${row.label}, spot ${row.spot + 1}`}
            onClick={() => onRemove({ kind: 'spot', lane: row.lane, spot: row.spot })}
          >
            Remove
          </Button>
        ),
      },
    );
  }
  return (
    <DataTable
      caption={caption}
      columns={columns}
      rows={rows}
      rowKey={(row) => row.key}
      empty={
        <p className="text-ink-soft">
          No spots are marked. A lane without spots says: nothing was seen there.
        </p>
      }
    />
  );
}
