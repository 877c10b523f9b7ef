'use client';

import { useState, type FormEvent } from 'react';

import { encodingWords, formatWords } from '@/components/imports/import-words';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { FormError, SelectField } from '@/components/ui/field';
import { messageOf, send } from '@/lib/api/client';
import { type ImportView } from '@/lib/api/types';
import { formats } from '@/lib/bibliography/record';

/** Reads the stored file once more, in another format or encoding. What was read before is dropped; nothing of it stands in the catalogue. */
export function ReadAgain({ row, onRead }: { row: ImportView; onRead: (row: ImportView) => void }) {
  const [open, setOpen] = useState(false);
  const [format, setFormat] = useState<string>(row.format ?? '');
  const [encoding, setEncoding] = useState('');
  const [problem, setProblem] = useState<string | null>(null);
  const [sending, setSending] = useState(false);
  const submit = async (event: FormEvent) => {
    event.preventDefault();
    setSending(true);
    setProblem(null);
    try {
      onRead(await send<ImportView>('POST', `/api/imports/${row.id}/read`, { format: format || null, encoding: encoding || null }));
      setOpen(false);
    } catch (error) {
      setProblem(messageOf(error));
    } finally {
      setSending(false);
    }
  };
  return (
    <>
      <Button kind="quiet" className="sm:order-first" onClick={() => setOpen(true)}>Read it otherwise</Button>
      <Dialog open={open} onOpenChange={setOpen} title="Read the file again" description="In another format or encoding than was found. Answers to matches of this file are asked anew.">
        <form onSubmit={submit} className="grid gap-4">
          {problem && <FormError>{problem}</FormError>}
          <SelectField label="Format" value={format} onChange={(event) => setFormat(event.target.value)}>
            <option value="">found by itself</option>
            {formats.map((name) => <option key={name} value={name}>{formatWords[name] ?? name}</option>)}
          </SelectField>
          <SelectField label="Encoding" value={encoding} onChange={(event) => setEncoding(event.target.value)} hint={row.encoding ? `Last read as ${encodingWords[row.encoding] ?? row.encoding}.` : undefined}>
            <option value="">found by itself</option>
            {Object.entries(encodingWords).map(([name, words]) => <option key={name} value={name}>{words}</option>)}
          </SelectField>
          <div className="flex justify-end gap-2">
            <Button kind="quiet" onClick={() => setOpen(false)}>Cancel</Button>
            <Button kind="primary" type="submit" disabled={sending}>{sending ? 'Sending' : 'Read again'}</Button>
          </div>
        </form>
      </Dialog>
    </>
  );
}
