import { notFound } from 'next/navigation';
import { cache } from 'react';

import { actorForPage } from '@/lib/access/actor';
import { queryOfPage } from '@/lib/api/page-query';
import { listCiting, listReferences } from '@/lib/catalogue/reading/citations';
import { listWorks, worksQuery } from '@/lib/catalogue/reading/list-works';
import { loadWork } from '@/lib/catalogue/reading/visibility';
import { readWork } from '@/lib/catalogue/reading/work-detail';
import { idOfPage } from '@/lib/portfolios/page';

const pageSize = 25;

/** Who looks at which work; "not found" where they may not see it. Looked up once in each request. */
export const workForPage = cache(async (workId: string) => {
  const actor = await actorForPage();
  const loaded = await loadWork({ actor, params: { workId: idOfPage(workId) } });
  if (!loaded) notFound();
  return { actor, row: loaded.row };
});

const pageNumber = (text: unknown) => (typeof text === 'string' && /^[1-9]\d{0,5}$/.test(text) ? Number(text) : 1);

/** Everything that the first paint of a work's page shows. */
export async function readWorkPage(workId: string, search: { references?: unknown; citing?: unknown }) {
  const { actor, row } = await workForPage(workId);
  const [work, references, citing] = await Promise.all([
    readWork(actor, row),
    listReferences(actor, row.id, { page: pageNumber(search.references), pageSize }),
    listCiting(actor, row.id, { page: pageNumber(search.citing), pageSize }),
  ]);
  return { work, references, citing };
}

/** The list that the works page first shows, by its address. */
export async function readWorksPage(portfolioId: number, search: Record<string, string | string[] | undefined>) {
  return listWorks(portfolioId, queryOfPage(worksQuery, search));
}
