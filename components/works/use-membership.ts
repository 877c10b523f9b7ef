'use client';

import { useState } from 'react';

import { count } from '@/components/ui/numbers';
import { useToast } from '@/components/ui/toast';
import { messageOf, send } from '@/lib/api/client';

/** The service takes at most this many works at once. */
const slice = 1000;

/** Takes works out of a portfolio; the toast that says so puts them back. */
export function useMembership(portfolioId: string, onChanged: () => void) {
  const show = useToast();
  const [sending, setSending] = useState(false);
  const [problem, setProblem] = useState<string | null>(null);
  const change = async (method: 'POST' | 'DELETE', ids: readonly string[]): Promise<boolean> => {
    setSending(true);
    setProblem(null);
    try {
      for (let from = 0; from < ids.length; from += slice) await send<{ changed: number }>(method, `/api/portfolios/${portfolioId}/works`, { workIds: ids.slice(from, from + slice) });
      return true;
    } catch (error) {
      setProblem(messageOf(error));
      return false;
    } finally {
      setSending(false);
      onChanged();
    }
  };
  const putBack = async (ids: readonly string[]) => {
    if (await change('POST', ids)) show({ text: `${count(ids.length, 'work')} put back` });
  };
  const remove = async (ids: readonly string[]) => {
    if (await change('DELETE', ids)) show({ text: `${count(ids.length, 'work')} taken out of the portfolio`, undo: () => putBack(ids) });
  };
  return { sending, problem, remove };
}
