'use client';

import { labelOf, nextSort, sortDirection, type DataColumn } from '@/components/tables/columns';
import { IconButton } from '@/components/ui/button';
import { SelectField } from '@/components/ui/field';
import { Icon } from '@/components/ui/icons';

interface NarrowSortProps<Row> {
  columns: readonly DataColumn<Row>[];
  sort: string;
  onSort: (sort: string) => void;
}

/** The order of a table whose heads are not shown: stacked rows on narrow screens. */
export function NarrowSort<Row>({ columns, sort, onSort }: NarrowSortProps<Row>) {
  const field = sort.replace(/^-/, '');
  const descending = sort.startsWith('-');
  const known = columns.some((column) => column.sort === field);
  return (
    <div className="flex items-end gap-2 md:hidden">
      <SelectField
        label="Sort by"
        className="min-w-0 flex-1"
        value={known ? field : ''}
        onChange={(event) => {
          const column = columns.find((one) => one.sort === event.target.value);
          if (column?.sort) onSort(nextSort('', column.sort, column.highestFirst ?? false));
        }}
      >
        {!known && <option value="">As given</option>}
        {columns.map((column) => column.sort && <option key={column.id} value={column.sort}>{labelOf(column)}</option>)}
      </SelectField>
      {known && (
        <IconButton label={descending ? 'Highest or last first; turn round' : 'Lowest or first first; turn round'} onClick={() => onSort(nextSort(sort, field, sortDirection(sort, field) === 'ascending'))}>
          <Icon name={descending ? 'down' : 'up'} />
        </IconButton>
      )}
    </div>
  );
}
