'use client';

import { useCallback, useRef, useState } from 'react';

import { messageOf, send } from '@/lib/api/client';
import { useMatches } from '@/lib/api/hooks';
import { type Page } from '@/lib/api/schemas';
import { type MatchView } from '@/lib/api/types';

export type Decision = 'same' | 'different' | 'later';

interface Decided {
  match: MatchView;
  decision: Decision;
}

/**
 * The open matches of an import, one after another. A decision shows at once and is sent behind it, in order; one that the service
 * refuses comes back to the front with the reason.
 */
export function useMatchQueue(portfolioId: string, importId: string | null, initial: Page<MatchView>, onSettled: () => void) {
  const { data = initial, mutate } = useMatches(portfolioId, { state: 'open', import: importId, pageSize: initial.pageSize }, { fallbackData: initial, revalidateOnFocus: false });
  const [decided, setDecided] = useState<Decided[]>([]);
  const [returned, setReturned] = useState<MatchView[]>([]);
  const [problem, setProblem] = useState<string | null>(null);
  const chain = useRef(Promise.resolve());

  const taken = new Set([...decided.map((one) => one.match.id), ...returned.map((match) => match.id)]);
  const waiting = [...returned, ...data.items.filter((match) => !taken.has(match.id))];
  const current = waiting[0] ?? null;
  const open = Math.max(waiting.length, data.total - data.items.filter((match) => decided.some((one) => one.match.id === match.id)).length);

  const sendBehind = useCallback(
    (work: () => Promise<unknown>, failed: () => void) => {
      chain.current = chain.current.then(async () => {
        try {
          await work();
          onSettled();
        } catch (error) {
          setProblem(messageOf(error));
          failed();
        }
      });
      return chain.current;
    },
    [onSettled],
  );

  const decide = useCallback(
    (match: MatchView, decision: Decision) => {
      setProblem(null);
      setDecided((list) => [...list, { match, decision }]);
      setReturned((list) => list.filter((one) => one.id !== match.id));
      const sent = sendBehind(
        () => send('POST', `/api/matches/${match.id}`, { decision }),
        () => {
          setDecided((list) => list.filter((one) => one.match.id !== match.id));
          setReturned((list) => [match, ...list.filter((one) => one.id !== match.id)]);
        },
      );
      // The page in hand is used up: the next ones are asked for once the service knows of this decision.
      if (waiting.length <= 2) void sent.then(() => mutate());
    },
    [sendBehind, waiting.length, mutate],
  );

  const last = decided[decided.length - 1] ?? null;
  const undo = useCallback(() => {
    if (!last) return;
    setProblem(null);
    setDecided((list) => list.filter((one) => one !== last));
    setReturned((list) => [last.match, ...list]);
    void sendBehind(
      () => send('DELETE', `/api/matches/${last.match.id}`),
      () => {
        setReturned((list) => list.filter((one) => one.id !== last.match.id));
        setDecided((list) => [...list, last]);
      },
    );
  }, [last, sendBehind]);

  return { current, position: decided.length + 1, total: decided.length + open, last, problem, decide, undo, renew: mutate };
}
