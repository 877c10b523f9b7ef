import pino from 'pino';

import { environment } from '@/lib/environment';

let logger: pino.Logger | undefined;

/** The one logger; secrets never go in, and request bodies neither. */
export function log(): pino.Logger {
  logger ??= pino({ level: environment().LOG_LEVEL, base: undefined });
  return logger;
}
