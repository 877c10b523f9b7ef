import { type Metadata } from 'next';

import { WorkPage } from '@/components/works/work-page';
import { type PageSearch } from '@/lib/api/page-query';
import { readWorkPage, workForPage } from '@/lib/catalogue/reading/pages';

interface WorkPageProps {
  params: Promise<{ workId: string }>;
  searchParams: PageSearch;
}

export async function generateMetadata({ params }: WorkPageProps): Promise<Metadata> {
  const { row } = await workForPage((await params).workId);
  return { title: row.title ?? row.authorsLabel ?? 'Work' };
}

export default async function Page({ params, searchParams }: WorkPageProps) {
  const { references, citing } = await searchParams;
  return <WorkPage {...await readWorkPage((await params).workId, { references, citing })} />;
}
