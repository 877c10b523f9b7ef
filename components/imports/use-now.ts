'use client';

import { useEffect, useState } from 'react';

/** The time in milliseconds, renewed every second while `running`; null on the server, which draws no time left. */
export function useNow(running: boolean): number | null {
  const [now, setNow] = useState<number | null>(null);
  useEffect(() => {
    if (!running) return;
    const timer = setInterval(() => setNow(Date.now()), 1000);
    return () => clearInterval(timer);
  }, [running]);
  return now;
}
