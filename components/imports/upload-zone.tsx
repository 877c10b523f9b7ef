'use client';

import { useState } from 'react';
import { useDropzone } from 'react-dropzone';

import { formatWords } from '@/components/imports/import-words';
import { useUploads } from '@/components/imports/use-uploads';
import { Button } from '@/components/ui/button';
import { SelectField } from '@/components/ui/field';
import { Icon } from '@/components/ui/icons';
import { count, formatBytes } from '@/components/ui/numbers';
import { Progress } from '@/components/ui/progress';
import { formats } from '@/lib/bibliography/record';

interface UploadZoneProps {
  portfolioId: string;
  /** A file has arrived: the list of imports knows more now. */
  onArrived: () => void;
}

/** Where files are dropped or chosen. Each file is a line with its own progress; one that fails keeps its line and can be tried again. */
export function UploadZone({ portfolioId, onArrived }: UploadZoneProps) {
  const [format, setFormat] = useState('');
  const { uploads, add, retry, busy } = useUploads(portfolioId, onArrived);
  const { getRootProps, getInputProps, isDragActive, open } = useDropzone({ onDrop: (files: File[]) => add(files, format), noClick: true, noKeyboard: true });

  return (
    <div className="grid gap-3">
      <div {...getRootProps()} className={`grid justify-items-center gap-3 rounded-sm border border-dashed px-4 py-7 text-center ${isDragActive ? 'border-indigo bg-weld-wash' : 'border-thread-strong bg-paper'}`}>
        <input {...getInputProps({ 'aria-label': 'Files to import' })} tabIndex={-1} />
        <p className="font-serif text-[1.125rem] leading-[1.5rem]">{isDragActive ? 'Let go to upload' : 'Drop reference exports here'}</p>
        <Button kind="primary" onClick={open}>
          <Icon name="upload" /> Choose files
        </Button>
        <p className="max-w-[40rem] text-small text-ink-soft">{formats.map((name) => formatWords[name] ?? name).join(', ')}; zip and gz archives of them; up to 2 GiB a file. The format is found by itself.</p>
        <details className="text-small">
          <summary className="text-indigo underline underline-offset-2">Choose the format instead</summary>
          <SelectField label="Read the next files as" value={format} onChange={(event) => setFormat(event.target.value)} className="mt-2 text-left">
            <option value="">what they are found to be</option>
            {formats.map((name) => <option key={name} value={name}>{formatWords[name] ?? name}</option>)}
          </SelectField>
        </details>
      </div>
      {uploads.length > 0 && (
        <ul aria-label="Uploads" className="divide-y divide-thread border-y border-thread">
          {uploads.map((upload) => (
            <li key={upload.key} className="grid gap-2 py-2.5 sm:grid-cols-[minmax(0,1fr)_minmax(0,22rem)] sm:items-center">
              <span className="font-mono text-small break-all">{upload.file.name}</span>
              {upload.state === 'failed' ? (
                <div role="alert" className="flex flex-wrap items-center justify-between gap-2 text-table text-madder">
                  <span className="min-w-0 flex-1">{upload.problem}</span>
                  <Button className="min-h-8 py-1" onClick={() => retry(upload.key)}>Try again</Button>
                </div>
              ) : upload.earlier ? (
                <p role="status" className="text-table text-weld-ink">
                  The same file stands here already, as <a href={`/portfolios/${portfolioId}/imports/${upload.earlier.id}`}>{upload.earlier.fileName}</a>. Nothing was added.
                </p>
              ) : (
                <Progress label={`Upload of ${upload.file.name}`} done={upload.sent} total={upload.file.size} detail={upload.state === 'sending' ? `Sending, ${formatBytes(upload.sent)} of ${formatBytes(upload.file.size)}` : 'Waits its turn'} still={upload.state === 'waiting'} />
              )}
            </li>
          ))}
        </ul>
      )}
      {busy && <p className="text-small text-ink-soft">{count(uploads.filter((one) => one.state === 'waiting' || one.state === 'sending').length, 'file')} on the way. Stay on this page until they have arrived; reading goes on without you.</p>}
    </div>
  );
}
