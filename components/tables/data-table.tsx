'use client';

import { flexRender, getCoreRowModel, useReactTable, type ColumnDef } from '@tanstack/react-table';
import { clsx } from 'clsx';
import { useMemo, type ReactNode } from 'react';

import { ColumnChooser } from '@/components/tables/column-chooser';
import { labelOf, type DataColumn } from '@/components/tables/columns';
import { DataTableHead } from '@/components/tables/data-table-head';
import { NarrowSort } from '@/components/tables/narrow-sort';
import { useColumnChoice } from '@/components/tables/use-column-choice';
import { useOverflow } from '@/components/tables/use-overflow';
import { isInControl, useRowFocus } from '@/components/tables/use-row-focus';
import { Skeleton } from '@/components/ui/status';

interface DataTableProps<Row> {
  /** Says what the table holds; shown to screen readers. */
  caption: string;
  columns: readonly DataColumn<Row>[];
  /** The rows of this page, in the order that the server gave. */
  rows: readonly Row[];
  rowKey: (row: Row) => string;
  /** 'title' or '-pageRank'; see useAddressState. */
  sort?: string;
  onSort?: (sort: string) => void;
  /** The row that the evidence panel is about. */
  selectedKey?: string | null;
  /** A press on the row or Enter; the row should hold a link to the same for those who use neither. */
  onOpen?: (row: Row) => void;
  /** Rows are on their way: skeletons where there are none yet. */
  loading?: boolean;
  skeletonRows?: number;
  /** Shown instead of the table when there are no rows. */
  empty?: ReactNode;
  /** Name under which the person's choice of columns is kept; without it there is no chooser. */
  name?: string;
  /** Above the table, left: fields that filter. */
  filters?: ReactNode;
  /** Above the table, right, after the column chooser: export and other buttons. */
  actions?: ReactNode;
}

/** Where a cell stands in a stacked row: a grid of two columns, with one more at the left where there is a lead. */
const places = {
  lead: 'max-md:col-start-1 max-md:row-start-1 max-md:row-end-[span_20]',
  title: 'max-md:col-span-2 max-md:pb-1',
  pair: 'max-md:pt-1.5',
  wide: 'max-md:col-span-2 max-md:pt-1.5',
  hidden: 'max-md:hidden',
};

/** A list that the server sorts and pages. Real table on wide screens, stacked rows on narrow ones. */
export function DataTable<Row>(props: DataTableProps<Row>) {
  const { caption, columns, rows, rowKey, sort = '', onSort, selectedKey = null, onOpen, loading = false, skeletonRows = 8, empty, name, filters, actions } = props;
  const [visible, choose] = useColumnChoice(name, Object.fromEntries(columns.filter((column) => column.hiddenAtFirst).map((column) => [column.id, false])));
  const definitions = useMemo<ColumnDef<Row>[]>(() => columns.map((column) => ({ id: column.id, header: () => column.head, cell: ({ row }) => column.cell(row.original), enableHiding: !column.fixed })), [columns]);
  const fixed = Object.fromEntries(columns.filter((column) => column.fixed).map((column) => [column.id, true]));
  // The rule warns that a compiler leaves this component alone, since TanStack's table changes in place. That is what it should do.
  // eslint-disable-next-line react-hooks/incompatible-library
  const table = useReactTable<Row>({
    data: rows as Row[],
    columns: definitions,
    getRowId: rowKey,
    getCoreRowModel: getCoreRowModel(),
    manualSorting: true,
    manualPagination: true,
    state: { columnVisibility: { ...visible, ...fixed } },
  });
  const byId = useMemo(() => new Map(columns.map((column) => [column.id, column])), [columns]);
  const shown = table.getVisibleLeafColumns().flatMap((one) => byId.get(one.id) ?? []);
  const lead = shown.some((column) => column.narrow === 'lead');
  const titleId = (shown.find((column) => column.narrow === 'title') ?? shown[0])?.id;
  const keys = rows.map(rowKey);
  const open = onOpen && ((key: string) => {
    const row = rows.find((one) => rowKey(one) === key);
    if (row) onOpen(row);
  });
  const { stop, press, setFocused } = useRowFocus(keys, selectedKey, open);
  const { box, overflows } = useOverflow<HTMLDivElement>();
  const sortable = columns.filter((column) => column.sort && visible[column.id] !== false);
  const rowLook = clsx(
    'border-b border-thread max-md:grid max-md:gap-x-3 max-md:py-3',
    lead ? 'max-md:grid-cols-[1.75rem_minmax(0,1fr)_minmax(0,1fr)]' : 'max-md:grid-cols-2',
  );

  return (
    <div className="grid min-w-0 gap-3">
      {(filters || actions || name) && (
        <div className="no-print flex flex-wrap items-end justify-between gap-x-4 gap-y-2">
          <div className="flex min-w-0 flex-1 flex-wrap items-end gap-2 max-md:basis-full">{filters}</div>
          <div className="flex flex-wrap gap-2">
            {name && <ColumnChooser columns={columns} shown={visible} onChange={choose} />}
            {actions}
          </div>
        </div>
      )}
      {onSort && sortable.length > 0 && rows.length > 0 && <NarrowSort columns={sortable} sort={sort} onSort={onSort} />}
      {rows.length === 0 && !loading ? (
        empty
      ) : (
        <div ref={box} className={clsx('relative', overflows && 'md:overflow-x-auto')} {...(overflows ? { role: 'region', 'aria-label': caption, tabIndex: 0 } : {})}>
          {/* The roles are said outright: laid out as stacked rows, browsers would drop them. */}
          <table role="table" aria-busy={loading || undefined} className="w-full border-collapse text-table max-md:block">
            <caption className="sr-only">{caption}</caption>
            <DataTableHead columns={shown} titleId={titleId} sort={sort} onSort={onSort} />
            <tbody role="rowgroup" className={clsx('max-md:block', loading && rows.length > 0 && 'opacity-60 transition-opacity')}>
              {table.getRowModel().rows.map((row) => (
                <tr
                  key={row.id}
                  role="row"
                  tabIndex={row.id === stop ? 0 : -1}
                  aria-current={row.id === selectedKey ? 'true' : undefined}
                  onFocus={() => setFocused(row.id)}
                  onKeyDown={(event) => press(event, row.id)}
                  onClick={(event) => {
                    // A press that marked text, or hit a link of its own, is not meant for the row.
                    if (open && !isInControl(event.target, event.currentTarget) && (window.getSelection()?.isCollapsed ?? true)) open(row.id);
                  }}
                  className={clsx(rowLook, 'focus-inset scroll-mt-14', onOpen && 'cursor-pointer', row.id === selectedKey ? 'bg-weld-wash' : onOpen && 'hover:bg-paper')}
                >
                  {row.getVisibleCells().map((cell) => {
                    const column = byId.get(cell.column.id);
                    if (!column) return null;
                    const place = column.narrow ?? (column.id === titleId ? 'title' : 'pair');
                    const Cell = column.id === titleId ? 'th' : 'td';
                    return (
                      <Cell
                        key={cell.id}
                        {...(Cell === 'th' ? { scope: 'row', role: 'rowheader' } : { role: 'cell' })}
                        className={clsx('px-1.5 py-2.5 align-middle font-normal first:pl-0 last:pr-1.5 max-md:px-0 max-md:py-0 max-md:text-left', column.numeric ? 'text-right' : 'text-left', column.numeric && 'md:whitespace-nowrap', places[place])}
                      >
                        {(place === 'pair' || place === 'wide') && <span className="block text-head text-ink-soft md:hidden">{labelOf(column)}</span>}
                        {flexRender(cell.column.columnDef.cell, cell.getContext())}
                      </Cell>
                    );
                  })}
                </tr>
              ))}
              {loading && rows.length === 0 && Array.from({ length: skeletonRows }, (_, index) => (
                <tr key={index} role="row" className="border-b border-thread max-md:block">
                  {shown.map((column) => (
                    <td key={column.id} role="cell" className={clsx('px-1.5 py-[1.125rem] max-md:block', column.id !== titleId && 'max-md:hidden')}>
                      <Skeleton className={clsx('h-4', column.id === titleId ? 'w-4/5' : 'ml-auto w-3/5')} />
                    </td>
                  ))}
                </tr>
              ))}
            </tbody>
          </table>
          {loading && <p role="status" className="sr-only">Reading the rows</p>}
        </div>
      )}
    </div>
  );
}
