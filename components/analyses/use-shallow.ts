'use client';

import { usePathname, useSearchParams } from 'next/navigation';
import { useCallback, type MouseEvent } from 'react';

import { changedQuery } from '@/components/ui/use-address';

type Changes = Record<string, string | number | null | undefined>;

/**
 * State of a view that the server need not know again: it stands in the address all the same, so that a link reproduces the view and the
 * back button undoes it, but changing it asks for no new page.
 */
export function useShallow() {
  const path = usePathname();
  const search = useSearchParams();
  const href = useCallback((changes: Changes) => `${path}${changedQuery(search, changes)}`, [path, search]);
  const set = useCallback(
    (changes: Changes, how: 'push' | 'replace' = 'push') => {
      // Read at the moment of the change: several may follow each other before the page is drawn again.
      const next = `${path}${changedQuery(new URLSearchParams(window.location.search), changes)}`;
      if (how === 'push') window.history.pushState(null, '', next);
      else window.history.replaceState(null, '', next);
    },
    [path],
  );
  /** Properties of a link that changes the address in place; opened in a new tab, it still leads to the same view. */
  const link = useCallback(
    (changes: Changes) => ({
      href: href(changes),
      onClick: (event: MouseEvent<HTMLAnchorElement>) => {
        if (event.metaKey || event.ctrlKey || event.shiftKey || event.altKey || event.button !== 0) return;
        event.preventDefault();
        set(changes);
      },
    }),
    [href, set],
  );
  return { search, href, set, link };
}
