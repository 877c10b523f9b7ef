import { type ReactNode } from 'react';

/** One column of a DataTable. */
export interface DataColumn<Row> {
  /** Unique in the table; also the name under which the choice of columns is kept. */
  id: string;
  /** Head of the column; may break into lines. */
  head: ReactNode;
  /** The head in plain words, for the chooser, the narrow layout and screen readers; needed when `head` is not text. */
  label?: string;
  cell: (row: Row) => ReactNode;
  /** The field that the API sorts by; without it the column does not sort. */
  sort?: string;
  /** The first press sorts from high to low: counts and measures. */
  highestFirst?: boolean;
  /** Figures stand at the right. */
  numeric?: boolean;
  /** Always shown. */
  fixed?: boolean;
  /** Not shown until chosen. */
  hiddenAtFirst?: boolean;
  /**
   * Place in the stacked rows of narrow screens: 'lead' stands large at the left (a rank), 'title' has the whole width and names the row,
   * 'pair' (unless told otherwise) stands with its label in two columns, 'wide' with its label in one line, 'hidden' is left out.
   */
  narrow?: 'lead' | 'title' | 'pair' | 'wide' | 'hidden';
  /** CSS width on wide screens; the column with none takes what is left. */
  width?: string;
}

export function labelOf<Row>(column: DataColumn<Row>): string {
  return column.label ?? (typeof column.head === 'string' ? column.head : column.id);
}

/** The order after a press on a column's head: its own first order, then the other way round. */
export function nextSort(current: string, field: string, highestFirst: boolean): string {
  if (current === field) return `-${field}`;
  if (current === `-${field}`) return field;
  return highestFirst ? `-${field}` : field;
}

export function sortDirection(current: string, field: string | undefined): 'ascending' | 'descending' | undefined {
  if (field === undefined) return undefined;
  return current === field ? 'ascending' : current === `-${field}` ? 'descending' : undefined;
}
