'use client';

import { useSyncExternalStore } from 'react';

const never = () => () => undefined;

/** The viewer's time zone. The server, which does not know it, says UTC; the browser then says it again without a hydration mismatch. */
export function useViewerZone(): string {
  return useSyncExternalStore(
    never,
    () => Intl.DateTimeFormat().resolvedOptions().timeZone,
    () => 'UTC',
  );
}
