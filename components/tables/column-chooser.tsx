'use client';

import { labelOf, type DataColumn } from '@/components/tables/columns';
import { Button } from '@/components/ui/button';
import { Menu, MenuCheckbox } from '@/components/ui/menu';

interface ColumnChooserProps<Row> {
  columns: readonly DataColumn<Row>[];
  shown: Record<string, boolean>;
  onChange: (id: string, shown: boolean) => void;
}

/** Which columns to show. */
export function ColumnChooser<Row>({ columns, shown, onChange }: ColumnChooserProps<Row>) {
  return (
    <Menu label="Columns" trigger={<Button>Columns</Button>}>
      {columns.filter((column) => !column.fixed).map((column) => (
        <MenuCheckbox key={column.id} checked={shown[column.id] !== false} onCheckedChange={(checked) => onChange(column.id, checked)}>
          {labelOf(column)}
        </MenuCheckbox>
      ))}
    </Menu>
  );
}
