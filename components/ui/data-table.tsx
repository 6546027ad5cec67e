import type { ReactNode } from 'react';

export type Column<Row> = {
  key: string;
  header: ReactNode;
  cell: (row: Row) => ReactNode;
  /** Numbers stand at the end of their column. */
  numeric?: boolean;
  /** This cell heads its row (one column at most); usually the link to the record. */
  rowHeader?: boolean;
  /** Direction shown when the table is sorted by this column; a sortable header is a link or button in `header`. */
  sorted?: 'ascending' | 'descending';
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
      <thead role="rowgroup" className="max-sm:sr-only">
        <tr role="row">
          {columns.map((column) => (
            <th
              key={column.key}
              role="columnheader"
              scope="col"
              aria-sort={column.sorted}
              className={`border-b-2 border-line-strong px-3 py-2 text-sm font-bold text-ink-soft ${column.numeric ? 'text-right' : 'text-left'}`}
            >
              {column.header}
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
              'px-3 py-2 align-middle max-sm:flex max-sm:justify-between max-sm:gap-4 max-sm:px-0 max-sm:text-right ' +
              `${column.numeric ? 'text-right whitespace-nowrap' : 'text-left'} ${column.rowHeader ? 'font-bold' : 'font-normal'} ${column.className ?? ''}`
            }
          >
            <span
              aria-hidden="true"
              className="shrink-0 text-left text-sm font-normal text-ink-soft sm:hidden"
            >
              {column.header}
            </span>
            <span className="min-w-0 max-sm:text-right">{column.cell(row)}</span>
          </Cell>
        );
      })}
    </tr>
  );
}
