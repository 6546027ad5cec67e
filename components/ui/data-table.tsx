import Link from 'next/link';
import type { ReactNode } from 'react';

export type Column<Row> = {
  key: string;
  header: string;
  cell: (row: Row) => ReactNode;
  /** Numbers stand at the end of their column. */
  numeric?: boolean;
  /** This cell heads its row (one column at most); usually the link to the record. */
  rowHeader?: boolean;
  /** Direction that the rows are sorted in by this column. */
  sorted?: 'ascending' | 'descending';
  /** Makes the header a link that sorts by this column; on a phone these stand in a row above the cards. */
  sortHref?: string;
  className?: string;
};

type DataTableProps<Row> = {
  caption: string;
  captionHidden?: boolean;
  columns: readonly Column<Row>[];
  rows: readonly Row[];
  rowKey: (row: Row) => string;
  /** Shown in place of the table when there are no rows. */
  empty?: ReactNode;
  /** Marks one row as the one being looked at. */
  currentKey?: string;
};

/**
 * A plain table. Under 640 px each row becomes a card with its column names beside the values, so that nothing scrolls
 * sideways; the explicit roles keep it a table for screen readers although its cells are no longer laid out as one.
 */
export function DataTable<Row>({
  caption,
  captionHidden = false,
  columns,
  rows,
  rowKey,
  empty,
  currentKey,
}: DataTableProps<Row>) {
  if (rows.length === 0 && empty) return <>{empty}</>;
  return (
    <table role="table" className="w-full border-collapse text-base max-sm:block">
      <caption className={captionHidden ? 'sr-only' : 'pb-2 text-left text-sm text-ink-soft max-sm:block'}>
        {caption}
      </caption>
      <thead
        role="rowgroup"
        className={columns.some((column) => column.sortHref) ? 'max-sm:block' : 'max-sm:sr-only'}
      >
        <tr role="row" className="max-sm:flex max-sm:flex-wrap max-sm:gap-x-4 max-sm:pb-2">
          {columns.map((column) => (
            <th
              key={column.key}
              role="columnheader"
              scope="col"
              aria-sort={column.sorted}
              className={
                'px-3 py-2 text-sm font-bold text-ink-soft sm:border-b-2 sm:border-line-strong max-sm:p-0 ' +
                `${column.numeric ? 'text-right' : 'text-left'} ${column.sortHref ? '' : 'max-sm:sr-only'}`
              }
            >
              {column.sortHref ? <SortLink column={column} /> : column.header}
            </th>
          ))}
        </tr>
      </thead>
      <tbody role="rowgroup" className="max-sm:flex max-sm:flex-col max-sm:gap-3">
        {rows.map((row) => (
          <Row key={rowKey(row)} row={row} columns={columns} current={currentKey === rowKey(row)} />
        ))}
      </tbody>
    </table>
  );
}

function SortLink<Row>({ column }: { column: Column<Row> }) {
  return (
    <Link href={column.sortHref!} scroll={false} className="link gap-1" title={`Sort by ${column.header}`}>
      {column.header}
      <svg width="10" height="12" viewBox="0 0 10 12" aria-hidden="true" className="shrink-0">
        {column.sorted ? (
          <path d={column.sorted === 'ascending' ? 'M5 2 9 9H1Z' : 'M5 10 1 3h8Z'} fill="currentColor" />
        ) : (
          <path d="M2 4.5h6M2 7.5h6" stroke="currentColor" />
        )}
      </svg>
    </Link>
  );
}

function Row<Row>({
  row,
  columns,
  current,
}: {
  row: Row;
  columns: readonly Column<Row>[];
  current: boolean;
}) {
  return (
    <tr
      role="row"
      aria-current={current || undefined}
      className={
        'border-b border-line hover:bg-paper-raised max-sm:block max-sm:rounded max-sm:border max-sm:bg-paper-raised max-sm:px-3 max-sm:py-1 ' +
        (current ? 'bg-glass-wash' : '')
      }
    >
      {columns.map((column) => {
        const Cell = column.rowHeader ? 'th' : 'td';
        return (
          <Cell
            key={column.key}
            role={column.rowHeader ? 'rowheader' : 'cell'}
            {...(column.rowHeader ? { scope: 'row' } : {})}
            className={
              'px-3 py-2 align-middle max-sm:flex max-sm:items-center max-sm:justify-between max-sm:gap-4 max-sm:px-0 max-sm:py-1 max-sm:text-right ' +
              `${column.numeric ? 'text-right whitespace-nowrap' : 'text-left'} ${column.rowHeader ? 'font-bold' : 'font-normal'} ${column.className ?? ''}`
            }
          >
            {column.rowHeader ? null : (
              <span
                aria-hidden="true"
                className="shrink-0 text-left text-sm font-normal text-ink-soft sm:hidden"
              >
                {column.header}
              </span>
            )}
            <span className={`min-w-0 ${column.rowHeader ? 'max-sm:text-left' : 'max-sm:text-right'}`}>
              {column.cell(row)}
            </span>
          </Cell>
        );
      })}
    </tr>
  );
}
