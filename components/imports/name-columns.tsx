'use client';

import { useState, type FormEvent } from 'react';

import { columnWords } from '@/components/imports/column-words';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { FormError, SelectField } from '@/components/ui/field';
import { messageOf, send } from '@/lib/api/client';
import { useImportColumns } from '@/lib/api/hooks';
import { type ImportColumnsView, type ImportView } from '@/lib/api/types';
import { columnKinds, type ColumnKind } from '@/lib/bibliography/readers/delimited-columns';

/** The first things that stand in a column, so that a person sees what it holds. */
function samplesOf({ rows }: ImportColumnsView, column: number): string {
  return rows.map((row) => row[column]).filter((cell) => cell !== '').slice(0, 3).map((cell) => (cell.length > 60 ? `${cell.slice(0, 59)}…` : cell)).join(' · ') || 'empty in the first rows';
}

function ColumnForm({ row, table, onRead, onCancel }: { row: ImportView; table: ImportColumnsView; onRead: (row: ImportView) => void; onCancel: () => void }) {
  const [columns, setColumns] = useState<(ColumnKind | null)[]>(table.chosen ?? table.columns);
  const [problem, setProblem] = useState<string | null>(null);
  const [sending, setSending] = useState(false);
  const submit = async (event: FormEvent) => {
    event.preventDefault();
    setSending(true);
    setProblem(null);
    try {
      onRead(await send<ImportView>('POST', `/api/imports/${row.id}/read`, { format: 'delimited', encoding: row.encoding, columns }));
    } catch (error) {
      setProblem(messageOf(error));
      setSending(false);
    }
  };
  return (
    <form onSubmit={submit} className="grid gap-4">
      {problem && <FormError>{problem}</FormError>}
      <ol className="grid max-h-[50vh] gap-3 overflow-y-auto pr-1" tabIndex={0} aria-label="Columns of the table">
        {table.heads.map((head, at) => (
          <li key={at} className="grid gap-1 border-b border-thread pb-3 last:border-b-0">
            <SelectField label={head || `Column ${at + 1}, without a head`} hint={samplesOf(table, at)} value={columns[at] ?? ''} onChange={(event) => setColumns(columns.map((kind, place) => (place === at ? ((event.target.value || null) as ColumnKind | null) : kind)))}>
              <option value="">something else, kept as text</option>
              {columnKinds.map((kind) => <option key={kind} value={kind}>{columnWords[kind]}</option>)}
            </SelectField>
          </li>
        ))}
      </ol>
      <div className="flex justify-end gap-2">
        <Button kind="quiet" onClick={onCancel}>Cancel</Button>
        <Button kind="primary" type="submit" disabled={sending}>{sending ? 'Sending' : 'Read with these columns'}</Button>
      </div>
    </form>
  );
}

/** Lets a person say what the columns of a table hold, before its records are accepted. Remembered for their next table with the same head. */
export function NameColumns({ row, onRead }: { row: ImportView; onRead: (row: ImportView) => void }) {
  const [open, setOpen] = useState(false);
  const { data: table, error } = useImportColumns(open ? row.id : null);
  return (
    <>
      <Button onClick={() => setOpen(true)}>Columns</Button>
      <Dialog open={open} onOpenChange={setOpen} title="What the columns hold" description="Found by their heads; change what was taken wrongly. Your next table with the same head is read the same way.">
        {error && <FormError>{messageOf(error)}</FormError>}
        {!table && !error && <p role="status" className="text-table text-ink-soft">Looking at the table …</p>}
        {table && (
          <ColumnForm
            row={row}
            table={table}
            onCancel={() => setOpen(false)}
            onRead={(next) => {
              setOpen(false);
              onRead(next);
            }}
          />
        )}
      </Dialog>
    </>
  );
}
