'use client';

import { useState } from 'react';

import { isUndoing } from '@/components/imports/import-words';
import { NameColumns } from '@/components/imports/name-columns';
import { ReadAgain } from '@/components/imports/read-again';
import { Button } from '@/components/ui/button';
import { formatNumber } from '@/components/ui/numbers';
import { Notice } from '@/components/ui/status';
import { messageOf, send } from '@/lib/api/client';
import { type ImportView } from '@/lib/api/types';

/** What can be done with an import where it stands. Nothing here asks first: all of it can be taken back. */
export function ImportActions({ row, onChanged }: { row: ImportView; onChanged: (row?: ImportView) => void }) {
  const [sending, setSending] = useState<string | null>(null);
  const [problem, setProblem] = useState<string | null>(null);
  const act = async (what: 'accept' | 'set-aside' | 'undo' | 'cancel') => {
    setSending(what);
    setProblem(null);
    try {
      onChanged(await send<ImportView>('POST', `/api/imports/${row.id}/${what}`));
    } catch (error) {
      setProblem(messageOf(error));
      // Somebody else may have moved it meanwhile.
      onChanged();
    } finally {
      setSending(null);
    }
  };
  const acceptable = row.counts ? row.counts.records - row.counts.rejected : 0;
  const { state } = row;
  const waits = state === 'review' || state === 'set-aside' || state === 'undone';
  return (
    <div className="grid gap-2 sm:justify-items-end">
      <div className="flex flex-wrap gap-2 sm:justify-end">
        {(state === 'uploaded' || state === 'reading' || state === 'checking') && <Button disabled={sending !== null} onClick={() => act('cancel')}>Stop reading</Button>}
        {(state === 'review' || state === 'failed') && <Button disabled={sending !== null} onClick={() => act('set-aside')}>Set aside</Button>}
        {waits && acceptable > 0 && <Button kind="primary" disabled={sending !== null} onClick={() => act('accept')}>Accept {formatNumber(acceptable)} now</Button>}
        {waits && row.format === 'delimited' && <NameColumns row={row} onRead={onChanged} />}
        {(waits || state === 'failed') && <ReadAgain row={row} onRead={onChanged} />}
        {state === 'accepted' && !isUndoing(row) && <Button disabled={sending !== null} onClick={() => act('undo')}>Undo import</Button>}
      </div>
      {problem && <Notice tone="problem">{problem}</Notice>}
    </div>
  );
}
