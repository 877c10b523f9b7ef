'use client';

import { useEffect, useSyncExternalStore } from 'react';

export interface KeyLine {
  /** As printed on the key: 'S', '/', 'Enter'; several with spaces between. */
  keys: string;
  does: string;
}

interface KeyGroup {
  title: string;
  lines: readonly KeyLine[];
}

interface KeyState {
  open: boolean;
  groups: readonly KeyGroup[];
}

let state: KeyState = { open: false, groups: [] };
const empty: KeyState = state;
const listeners = new Set<() => void>();

function change(next: KeyState): void {
  state = next;
  for (const listener of listeners) listener();
}

function subscribe(listener: () => void): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}

export function setKeyboardHelp(open: boolean): void {
  change({ ...state, open });
}

export function useKeyboardHelp(): KeyState {
  return useSyncExternalStore(subscribe, () => state, () => empty);
}

/** Adds a page's own keys to the list that `?` opens, while that page is shown. `lines` must be a constant of the module. */
export function usePageKeys(title: string, lines: readonly KeyLine[]): void {
  useEffect(() => {
    const group = { title, lines };
    change({ ...state, groups: [...state.groups, group] });
    return () => change({ ...state, groups: state.groups.filter((one) => one !== group) });
  }, [title, lines]);
}
