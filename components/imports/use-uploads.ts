'use client';

import { useCallback, useEffect, useRef, useState } from 'react';

import { messageOf, sendFiles } from '@/lib/api/client';
import { type Page } from '@/lib/api/schemas';
import { type ImportView } from '@/lib/api/types';

export interface Upload {
  key: number;
  file: File;
  /** Bytes sent. */
  sent: number;
  state: 'waiting' | 'sending' | 'failed' | 'already';
  problem: string | null;
  /** The earlier import of the same file. */
  earlier: ImportView | null;
  format: string;
}

/** Uploads at once: the service reads one file at a time anyway, and a slow line is not made faster. */
const sideBySide = 2;

/** A queue of uploads into one portfolio. Files that arrived leave it; those that failed stay and can be sent again. */
export function useUploads(portfolioId: string, onArrived: () => void) {
  const [uploads, setUploads] = useState<Upload[]>([]);
  const queue = useRef<Upload[]>([]);
  const lastKey = useRef(0);

  const pump = useCallback(() => {
    const publish = () => setUploads([...queue.current]);
    const change = (key: number, changes: Partial<Upload>) => {
      queue.current = queue.current.map((one) => (one.key === key ? { ...one, ...changes } : one));
      publish();
    };
    const next = () => {
      while (queue.current.filter((one) => one.state === 'sending').length < sideBySide) {
        const upload = queue.current.find((one) => one.state === 'waiting');
        if (!upload) break;
        change(upload.key, { state: 'sending' });
        void send(upload);
      }
      publish();
    };
    const send = async ({ key, file, format }: Upload) => {
      try {
        const { items } = await sendFiles<Page<ImportView>>(`/api/portfolios/${portfolioId}/imports`, [file], format ? { format } : {}, { onProgress: (sent) => change(key, { sent: Math.min(sent, file.size) }) });
        // An archive brings several; it leaves the queue when any of them is new.
        if (items.every((one) => one.alreadyThere)) change(key, { state: 'already', earlier: items[0] });
        else queue.current = queue.current.filter((one) => one.key !== key);
        onArrived();
      } catch (error) {
        change(key, { state: 'failed', problem: messageOf(error) });
      }
      next();
    };
    next();
  }, [portfolioId, onArrived]);

  const add = useCallback(
    (files: File[], format: string) => {
      queue.current = [...queue.current, ...files.map((file) => ({ key: (lastKey.current += 1), file, sent: 0, state: 'waiting' as const, problem: null, earlier: null, format }))];
      pump();
    },
    [pump],
  );
  const retry = useCallback(
    (key: number) => {
      queue.current = queue.current.map((one) => (one.key === key ? { ...one, state: 'waiting', sent: 0, problem: null } : one));
      pump();
    },
    [pump],
  );

  const busy = uploads.some((one) => one.state === 'waiting' || one.state === 'sending');
  useEffect(() => {
    if (!busy) return;
    const warn = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener('beforeunload', warn);
    return () => window.removeEventListener('beforeunload', warn);
  }, [busy]);

  return { uploads, add, retry, busy };
}
