'use client';

import { useCallback, useMemo, useSyncExternalStore } from 'react';

const changed = 'heddle-columns-changed';
const storageKey = (name: string) => `heddle-columns:${name}`;

function subscribe(onChange: () => void): () => void {
  window.addEventListener(changed, onChange);
  window.addEventListener('storage', onChange);
  return () => {
    window.removeEventListener(changed, onChange);
    window.removeEventListener('storage', onChange);
  };
}

/** What this session chose where the browser keeps nothing. */
const unkept = new Map<string, string>();

function readText(key: string): string | null {
  try {
    return localStorage.getItem(key) ?? unkept.get(key) ?? null;
  } catch {
    return unkept.get(key) ?? null;
  }
}

function parseChoice(text: string | null): Record<string, boolean> {
  if (text === null) return {};
  try {
    const stored: unknown = JSON.parse(text);
    if (typeof stored !== 'object' || stored === null) return {};
    return Object.fromEntries(Object.entries(stored).filter((entry): entry is [string, boolean] => typeof entry[1] === 'boolean'));
  } catch {
    // Anything may stand in a browser's storage; what is not a choice counts as none.
    return {};
  }
}

/** Which columns a person wants to see in the table of this name, kept in their browser. The server, which cannot know, shows the defaults. */
export function useColumnChoice(name: string | undefined, defaults: Record<string, boolean>): [Record<string, boolean>, (id: string, shown: boolean) => void] {
  const key = storageKey(name ?? '');
  const text = useSyncExternalStore(subscribe, () => (name ? readText(key) : null), () => null);
  const chosen = useMemo(() => parseChoice(text), [text]);
  const choose = useCallback(
    (id: string, shown: boolean) => {
      const next = JSON.stringify({ ...parseChoice(readText(key)), [id]: shown });
      unkept.set(key, next);
      try {
        localStorage.setItem(key, next);
      } catch {
        // Storage is shut off or full: the choice then holds until the page is left.
      }
      window.dispatchEvent(new Event(changed));
    },
    [key],
  );
  return [{ ...defaults, ...chosen }, choose];
}
