'use client';

import { useEffect, useRef } from 'react';

/** Single-key answers: not while somebody types, holds a modifier or has a dialog open. */
export function useKeys(keys: Record<string, () => void>, enabled: boolean): void {
  const latest = useRef(keys);
  useEffect(() => {
    latest.current = keys;
  });
  useEffect(() => {
    if (!enabled) return;
    const press = (event: KeyboardEvent) => {
      if (event.ctrlKey || event.metaKey || event.altKey || event.repeat) return;
      const target = event.target instanceof Element ? event.target : null;
      if (target?.closest('input, textarea, select, [contenteditable], [role="dialog"], [role="menu"]')) return;
      const answer = latest.current[event.key.toLowerCase()];
      if (!answer) return;
      event.preventDefault();
      answer();
    };
    window.addEventListener('keydown', press);
    return () => window.removeEventListener('keydown', press);
  }, [enabled]);
}
