import { type Metadata } from 'next';

import { ImportPage, type Shown } from '@/components/imports/import-page';
import { may } from '@/lib/access/permissions';
import { type PageSearch } from '@/lib/api/page-query';
import { importForPage, readImportPage } from '@/lib/imports/pages';

interface Props {
  params: Promise<{ portfolioId: string; importId: string }>;
  searchParams: PageSearch;
}

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { portfolioId, importId } = await params;
  return { title: (await importForPage(portfolioId, importId)).imported.fileName };
}

const shows: readonly Shown[] = ['new', 'known', 'review', 'rejected', 'problems'];

export default async function Page({ params, searchParams }: Props) {
  const { portfolioId, importId } = await params;
  const { actor, level, imported } = await importForPage(portfolioId, importId);
  const { show, page } = await searchParams;
  const shown = shows.find((one) => one === show) ?? 'all';
  const pageNumber = typeof page === 'string' && /^[1-9]\d{0,5}$/.test(page) ? Number(page) : 1;
  // Another filter or page is another list: nothing of the last one is carried over.
  return <ImportPage key={`${shown} ${pageNumber}`} shown={shown} page={pageNumber} mayDecide={may(actor, 'import.decide', level)} {...await readImportPage(actor, imported, shown, pageNumber)} />;
}
