'use client';

import { useSyncExternalStore } from 'react';

const never = () => () => undefined;

/** A moment in the viewer's time zone, as "14 May 2026, 09:30". The server, which does not know the zone, says UTC; the browser then says it again. */
export function Moment({ at, dateOnly = false }: { at: string; dateOnly?: boolean }) {
  const zone = useSyncExternalStore(
    never,
    () => Intl.DateTimeFormat().resolvedOptions().timeZone,
    () => 'UTC',
  );
  const format = new Intl.DateTimeFormat('en-GB', { day: 'numeric', month: 'long', year: 'numeric', ...(dateOnly ? {} : { hour: '2-digit', minute: '2-digit' }), timeZone: zone });
  return (
    <time dateTime={at} className="whitespace-nowrap">
      {format.format(new Date(at)).replace(' at ', ', ')}
    </time>
  );
}
