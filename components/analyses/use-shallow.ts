'use client';

import { useCallback, type MouseEvent } from 'react';

import { useAddress } from '@/components/ui/use-address';

type Changes = Record<string, string | number | null | undefined>;

/** State of a view that the server need not know again, with links that change it in place. */
export function useShallow() {
  const { search, href, show } = useAddress();
  /** Properties of a link that changes the address in place; opened in a new tab, it still leads to the same view. */
  const link = useCallback(
    (changes: Changes) => ({
      href: href(changes),
      onClick: (event: MouseEvent<HTMLAnchorElement>) => {
        if (event.metaKey || event.ctrlKey || event.shiftKey || event.altKey || event.button !== 0) return;
        event.preventDefault();
        show(changes);
      },
    }),
    [href, show],
  );
  return { search, href, set: show, link };
}
