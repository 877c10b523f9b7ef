import { type Metadata } from 'next';

import { ImportList } from '@/components/imports/import-list';
import { PageHeader } from '@/components/ui/page-header';
import { may } from '@/lib/access/permissions';
import { queryOfPage, type PageSearch } from '@/lib/api/page-query';
import { importsQuery } from '@/lib/imports/pages';
import { listImports } from '@/lib/imports/lists';
import { portfolioForPage } from '@/lib/portfolios/page';

export const metadata: Metadata = { title: 'Imports' };

export default async function ImportsPage({ params, searchParams }: { params: Promise<{ portfolioId: string }>; searchParams: PageSearch }) {
  const { actor, row, level } = await portfolioForPage((await params).portfolioId);
  const list = await listImports(row.id, queryOfPage(importsQuery, await searchParams));
  return (
    <div className="grid gap-6 px-4 pt-6 pb-12 md:px-7">
      <PageHeader title="Imports" subtitle="Files on their way into this portfolio. Nothing is catalogued until somebody accepts it, and every import can be undone." />
      <ImportList portfolioId={String(row.id)} initial={list} mayUpload={may(actor, 'import.create', level)} />
    </div>
  );
}
