import { select } from '@/lib/db/bulk';

/**
 * Figures over a whole portfolio take seconds where it holds a hundred thousand works, and change only when the catalogue or the portfolio's
 * members do. They are kept in this process under a stamp of both, which is read anew for every answer; another process keeps its own.
 */
const kept = new Map<string, { stamp: string; value: Promise<unknown> }>();
const most = 500;

/** The catalogue's version and the time of the portfolio's last change by hand. */
async function readStamp(portfolioId: number): Promise<string> {
  const rows = await select<{ stamp: string }>(
    null,
    `SELECT CONCAT_WS('/', portfolio.updatedAt, (SELECT version FROM locks WHERE name = 'catalogue')) AS stamp FROM portfolios portfolio WHERE portfolio.id = :portfolioId`,
    { portfolioId },
  );
  return rows[0]?.stamp ?? '';
}

/** The value of `count` for the portfolio as it stands now; counted anew only after a change. A count that fails is not kept. */
export async function asItStands<Value>(portfolioId: number, name: string, count: () => Promise<Value>): Promise<Value> {
  const key = `${portfolioId} ${name}`;
  const stamp = await readStamp(portfolioId);
  const held = kept.get(key);
  if (held?.stamp === stamp) return held.value as Promise<Value>;
  const value = count();
  kept.delete(key);
  kept.set(key, { stamp, value });
  if (kept.size > most) kept.delete(kept.keys().next().value as string);
  value.catch(() => {
    if (kept.get(key)?.value === value) kept.delete(key);
  });
  return value;
}
