'use client';

import { useCallback, useState } from 'react';

/** Rows that are ticked, by id; they stay ticked from page to page of a list. */
export function useSelection() {
  const [chosen, setChosen] = useState<ReadonlySet<string>>(new Set());
  const toggle = useCallback((ids: readonly string[], on: boolean) => {
    setChosen((before) => {
      const next = new Set(before);
      for (const id of ids) {
        if (on) next.add(id);
        else next.delete(id);
      }
      return next;
    });
  }, []);
  const clear = useCallback(() => setChosen(new Set()), []);
  return { chosen, toggle, clear };
}
