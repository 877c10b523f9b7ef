import { clsx } from 'clsx';

import { labelOf, nextSort, sortDirection, type DataColumn } from '@/components/tables/columns';
import { Icon } from '@/components/ui/icons';

interface DataTableHeadProps<Row> {
  columns: readonly DataColumn<Row>[];
  /** The column that names the rows: without a width of its own it has the largest, so that rows on their way and rows that came stand alike. */
  titleId: string | undefined;
  sort: string;
  onSort?: (sort: string) => void;
}

/** The head of a DataTable: stays in view, sorts by its buttons. Its rule is a shadow, since borders of sticky cells scroll away. */
export function DataTableHead<Row>({ columns, titleId, sort, onSort }: DataTableHeadProps<Row>) {
  return (
    <thead role="rowgroup" className="max-md:hidden">
      <tr role="row">
        {columns.map((column) => {
          const direction = sortDirection(sort, column.sort);
          const look = clsx('inline-flex items-end gap-1 align-bottom text-head font-semibold', column.numeric ? 'flex-row-reverse text-right' : 'text-left', direction ? 'text-ink' : 'text-ink-soft');
          return (
            <th
              key={column.id}
              scope="col"
              role="columnheader"
              aria-sort={column.sort && onSort ? (direction ?? 'none') : undefined}
              style={{ width: column.width ?? (column.id === titleId ? '42%' : undefined) }}
              className={clsx('sticky top-0 z-10 bg-linen px-1.5 pt-2 pb-2.5 align-bottom shadow-[inset_0_-1px_var(--ink)] first:pl-0 last:pr-1.5', column.numeric ? 'text-right' : 'text-left')}
            >
              {column.sort && onSort ? (
                <button type="button" className={clsx(look, 'group hover:text-ink')} onClick={() => onSort(nextSort(sort, column.sort ?? '', column.highestFirst ?? false))}>
                  <span>{column.head}</span>
                  <Icon name={direction === 'ascending' ? 'up' : 'down'} size={12} className={clsx('mb-0.5 shrink-0', !direction && 'opacity-0 group-hover:opacity-60 group-focus-visible:opacity-60')} />
                </button>
              ) : (
                <span className={look}>{column.head ?? <span className="sr-only">{labelOf(column)}</span>}</span>
              )}
            </th>
          );
        })}
      </tr>
    </thead>
  );
}
