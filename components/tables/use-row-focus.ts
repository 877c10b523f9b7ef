'use client';

import { useState, type KeyboardEvent } from 'react';

/** Whether the event belongs to a control within the row. */
export function isInControl(target: EventTarget | null, row: Element): boolean {
  const control = target instanceof Element ? target.closest('a, button, input, select, textarea, label, summary') : null;
  return control !== null && row.contains(control);
}

/** Rows with one stop for Tab among them: arrows, Home and End go from row to row, Enter opens. */
export function useRowFocus(keys: readonly string[], selectedKey: string | null, onOpen: ((key: string) => void) | undefined) {
  const [focused, setFocused] = useState<string | null>(null);
  const stop = [focused, selectedKey, keys[0]].find((key) => key != null && keys.includes(key)) ?? null;
  const press = (event: KeyboardEvent<HTMLTableRowElement>, key: string) => {
    // Only while the row itself has the focus: links and buttons within it keep their keys.
    if (event.target !== event.currentTarget || event.ctrlKey || event.metaKey || event.altKey) return;
    if (event.key === 'Enter' && onOpen) {
      event.preventDefault();
      onOpen(key);
      return;
    }
    const index = keys.indexOf(key);
    const next = { ArrowDown: index + 1, ArrowUp: index - 1, Home: 0, End: keys.length - 1 }[event.key];
    if (next === undefined || next < 0 || next >= keys.length) return;
    event.preventDefault();
    const row = event.currentTarget.parentElement?.children[next];
    if (row instanceof HTMLElement) row.focus();
  };
  return { stop, press, setFocused };
}
