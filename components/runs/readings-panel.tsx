'use client';
import { useRouter } from 'next/navigation';
import { useState } from 'react';
import useSWRInfinite from 'swr/infinite';
import { Button } from '@/components/ui/button';
import { type Column, DataTable } from '@/components/ui/data-table';
import { Notice } from '@/components/ui/notice';
import { Skeleton } from '@/components/ui/skeleton';
import type { ReadingJson } from '@/lib/distillation/reading-schema';
import { fetcher } from '@/lib/http/client';
import { formatPressure } from '@/lib/units/pressure';
import { LocalTime } from './local-time';
import { ReadingEntry } from './reading-entry';
import { usePressureUnit } from './use-pressure-unit';

type Page = { items: ReadingJson[]; nextCursor: string | null };
const celsius = (value: number | null) => (value === null ? '–' : `${value.toFixed(1)} °C`);

/** Log readings: the quick entry, and the list in the order of their times. */
export function ReadingsPanel({ runCode, entryReason }: { runCode: string; entryReason: string | null }) {
  const router = useRouter();
  const [unit] = usePressureUnit();
  // Fetched when somebody looks: the curve above already shows them.
  const [open, setOpen] = useState(false);
  const path = `/api/v1/runs/${runCode}/readings?limit=20`;
  const { data, error, size, setSize, mutate, isLoading } = useSWRInfinite<Page>(
    (at: number, before: Page | null) =>
      !open || (before && !before.nextCursor) ? null : before ? `${path}&cursor=${before.nextCursor}` : path,
    fetcher,
  );
  const readings = data?.flatMap((page) => page.items) ?? [];
  const columns: Column<ReadingJson>[] = [
    { key: 'at', header: 'Time', rowHeader: true, cell: (r) => <LocalTime at={r.at} /> },
    { key: 'head', header: 'Head', numeric: true, cell: (r) => celsius(r.headTemperatureC) },
    { key: 'bath', header: 'Bath', numeric: true, cell: (r) => celsius(r.bathTemperatureC) },
    {
      key: 'pressure',
      header: 'Pressure',
      numeric: true,
      cell: (r) => (r.pressureMbar === null ? '–' : formatPressure(r.pressureMbar, unit)),
    },
    {
      key: 'volume',
      header: 'Collected',
      numeric: true,
      cell: (r) => (r.volumeMl === null ? '–' : `${r.volumeMl} mL`),
    },
    { key: 'note', header: 'Note', cell: (r) => r.note ?? '–' },
    { key: 'by', header: 'From', cell: (r) => (r.sentBy === 'token' ? 'instrument' : 'typed') },
  ];
  const added = () => {
    void mutate();
    router.refresh();
  };
  return (
    <div className="grid items-start gap-6 lg:grid-cols-[minmax(0,26rem)_minmax(0,1fr)]">
      {entryReason ? (
        <p className="text-ink-soft">{entryReason}</p>
      ) : (
        <ReadingEntry runCode={runCode} onAdded={added} />
      )}
      <details className="min-w-0" onToggle={(event) => setOpen(event.currentTarget.open)}>
        <summary className="flex min-h-target w-fit items-center text-glass underline underline-offset-4">
          Readings as a list
        </summary>
        {error ? (
          <Notice
            kind="fails"
            title="The readings did not come"
            live
            action={<Button onClick={() => mutate()}>Ask again</Button>}
          >
            {error.message}
          </Notice>
        ) : isLoading ? (
          <Skeleton label="Fetching the readings" />
        ) : (
          <DataTable
            caption="Log readings"
            captionHidden
            columns={columns}
            rows={readings}
            rowKey={(reading) => reading.id}
            empty={<p className="text-ink-soft">No reading yet. The first one belongs to the first drop.</p>}
          />
        )}
        {data?.at(-1)?.nextCursor ? (
          <Button className="mt-3" onClick={() => setSize(size + 1)}>
            More readings
          </Button>
        ) : null}
      </details>
    </div>
  );
}
