import { notFound } from 'next/navigation';
import { z } from 'zod';

import { paging } from '@/lib/api/schemas';
import { type Import } from '@/models/import';
import { listImportProblems, listImportRecords, loadImport, presentImports } from '@/lib/imports/lists';
import { listMatches } from '@/lib/matches/matches';
import { type Actor } from '@/lib/access/permissions';
import { idOfPage, portfolioForPage, type PortfolioOnPage } from '@/lib/portfolios/page';

export const importsQuery = z.object({ page: paging.page, pageSize: paging.pageSize });

/** The import of a page's address, in the portfolio of that address; "not found" for any other. */
export async function importForPage(portfolioId: string, importId: string): Promise<PortfolioOnPage & { imported: Import }> {
  const page = await portfolioForPage(portfolioId);
  const loaded = await loadImport({ actor: page.actor, params: { importId: idOfPage(importId) } });
  if (!loaded || loaded.portfolioId !== page.row.id) notFound();
  return { ...page, imported: loaded.row };
}

/** Everything that the first paint of an import's page shows. */
export async function readImportPage(actor: Actor, row: Import, shown: 'all' | 'new' | 'known' | 'review' | 'rejected' | 'problems', page: number) {
  const outcome = shown === 'all' || shown === 'problems' ? undefined : shown;
  const [[initial], records, problems, matches] = await Promise.all([
    presentImports([row]),
    listImportRecords(row.id, { page: shown === 'problems' ? 1 : page, pageSize: 50, outcome }),
    listImportProblems(row.id, { page: shown === 'problems' ? page : 1, pageSize: 50 }),
    listMatches(actor, row.portfolioId, { page: 1, pageSize: 50, state: 'open', import: row.id }),
  ]);
  return { initial, records, problems, matches };
}
