import { type Metadata } from 'next';
import { type ReactNode } from 'react';

import { Place } from '@/components/frame/place';
import { SectionRow } from '@/components/frame/section-row';
import { portfolioForPage } from '@/lib/portfolios/page';

interface LayoutProps {
  params: Promise<{ portfolioId: string }>;
  children: ReactNode;
}

export async function generateMetadata({ params }: Pick<LayoutProps, 'params'>): Promise<Metadata> {
  const { row } = await portfolioForPage((await params).portfolioId);
  return { title: { default: `${row.name} · Heddle`, template: `%s · ${row.name} · Heddle` } };
}

const sections = [['', 'Overview'], ['/imports', 'Imports'], ['/works', 'Works'], ['/rankings', 'Rankings'], ['/clusters', 'Clusters'], ['/map', 'Map'], ['/analyses', 'Analyses']] as const;

/** The row of sections below the header. A portfolio that the person was not given does not exist. */
export default async function PortfolioLayout({ params, children }: LayoutProps) {
  const { row } = await portfolioForPage((await params).portfolioId);
  return (
    <>
      <Place items={[{ label: 'Portfolios', href: '/portfolios' }, { label: row.name }]} />
      <SectionRow label={row.name} items={sections.map(([path, label]) => ({ href: `/portfolios/${row.id}${path}`, label }))} />
      {children}
    </>
  );
}
