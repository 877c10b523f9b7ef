import { notFound } from 'next/navigation';
import { cache } from 'react';

import { actorForPage } from '@/lib/access/actor';
import { grantLevelOf } from '@/lib/access/grants';
import { type Actor, type GrantLevel } from '@/lib/access/permissions';
import { loadPortfolio } from '@/lib/portfolios/load';
import { type Portfolio } from '@/models/portfolio';

export interface PortfolioOnPage {
  actor: Actor;
  row: Portfolio;
  level: GrantLevel;
}

/** An id of an address; anything else is nothing. */
export function idOfPage(text: string): number {
  if (!/^[1-9]\d{0,15}$/.test(text)) notFound();
  return Number(text);
}

/** Who looks at which portfolio with which grant; "not found" where they were not given it. Looked up once in each request. */
export const portfolioForPage = cache(async (portfolioId: string): Promise<PortfolioOnPage> => {
  const actor = await actorForPage();
  const loaded = await loadPortfolio({ actor, params: { portfolioId: idOfPage(portfolioId) } });
  const level = loaded && (await grantLevelOf(actor, loaded.row.id));
  if (!loaded || level === null) notFound();
  return { actor, row: loaded.row, level };
});
