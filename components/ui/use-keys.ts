'use client';

import { useEffect, useRef } from 'react';

/** Whether a key press belongs to what has the focus: a field, a menu, an open dialog. */
function isTaken(event: KeyboardEvent): boolean {
  const target = event.target instanceof Element ? event.target : null;
  return target?.closest('input, textarea, select, [contenteditable="true"], [role="dialog"], [role="menu"], [role="listbox"]') != null;
}

/** Single-key shortcuts of a page, by the key's own name ('s', '?', '/', 'Escape'). Not while somebody types, holds Control, Alt or Command, or has a dialog open. */
export function useKeys(keys: Record<string, () => void>, enabled = true): void {
  const latest = useRef(keys);
  useEffect(() => {
    latest.current = keys;
  });
  useEffect(() => {
    if (!enabled) return;
    const press = (event: KeyboardEvent) => {
      if (event.defaultPrevented || event.ctrlKey || event.metaKey || event.altKey || event.repeat || isTaken(event)) return;
      const answer = latest.current[event.key.length === 1 ? event.key.toLowerCase() : event.key];
      if (!answer) return;
      event.preventDefault();
      answer();
    };
    window.addEventListener('keydown', press);
    return () => window.removeEventListener('keydown', press);
  }, [enabled]);
}
