'use client';

import { useSyncExternalStore } from 'react';

import { schemeKey } from '@/components/frame/scheme-script';

export type SchemeChoice = 'light' | 'dark' | 'system';

function readChoice(): SchemeChoice {
  try {
    const stored = localStorage.getItem(schemeKey);
    return stored === 'light' || stored === 'dark' ? stored : 'system';
  } catch {
    // Storage may be shut off by the person's settings: then the system decides.
    return 'system';
  }
}

function subscribe(onChange: () => void): () => void {
  window.addEventListener(schemeKey, onChange);
  window.addEventListener('storage', onChange);
  return () => {
    window.removeEventListener(schemeKey, onChange);
    window.removeEventListener('storage', onChange);
  };
}

function choose(choice: SchemeChoice): void {
  try {
    if (choice === 'system') localStorage.removeItem(schemeKey);
    else localStorage.setItem(schemeKey, choice);
  } catch {
    document.documentElement.dataset.scheme = choice === 'system' ? 'light' : choice;
    return;
  }
  // The script of the root layout listens and repaints.
  window.dispatchEvent(new Event(schemeKey));
}

/** The person's choice of scheme, kept in this browser. */
export function useScheme(): [SchemeChoice, (choice: SchemeChoice) => void] {
  return [useSyncExternalStore(subscribe, readChoice, () => 'system'), choose];
}

function subscribeShown(onChange: () => void): () => void {
  const observer = new MutationObserver(onChange);
  observer.observe(document.documentElement, { attributes: true, attributeFilter: ['data-scheme'] });
  return () => observer.disconnect();
}

/** The scheme on screen, for what draws with its own colours (the map). */
export function useShownScheme(): 'light' | 'dark' {
  return useSyncExternalStore(
    subscribeShown,
    () => (document.documentElement.dataset.scheme === 'dark' ? 'dark' : 'light'),
    () => 'light',
  );
}
