'use client';

import { usePathname, useRouter, useSearchParams } from 'next/navigation';
import { useCallback } from 'react';

type Changes = Record<string, string | number | null | undefined>;

/** A query with some fields changed; null, undefined and '' take a field away. */
export function changedQuery(search: URLSearchParams, changes: Changes): string {
  const next = new URLSearchParams(search);
  for (const [name, value] of Object.entries(changes)) {
    if (value === null || value === undefined || value === '') next.delete(name);
    else next.set(name, String(value));
  }
  const text = next.toString();
  return text ? `?${text}` : '';
}

/** The view's state, kept in the address: a link reproduces it, the back button undoes it. */
export function useAddress() {
  const router = useRouter();
  const path = usePathname();
  const search = useSearchParams();
  const href = useCallback((changes: Changes) => `${path}${changedQuery(search, changes)}`, [path, search]);
  /** `push` for what people would go back from; `replace` for what follows every keystroke. */
  const go = useCallback((changes: Changes, how: 'push' | 'replace' = 'push') => router[how](href(changes), { scroll: false }), [router, href]);
  /** As `go`, but asks the server for no new page: for what the browser reads itself. Several changes may follow each other before the page is drawn again. */
  const show = useCallback(
    (changes: Changes, how: 'push' | 'replace' = 'push') => {
      const next = `${path}${changedQuery(new URLSearchParams(window.location.search), changes)}`;
      if (how === 'push') window.history.pushState(null, '', next);
      else window.history.replaceState(null, '', next);
    },
    [path],
  );
  return { search, href, go, show };
}
