'use client';

import { type ReactNode } from 'react';

import { ExampleEvidence } from './example-evidence';
import { examplePortfolio } from './example-data';
import { Header } from '@/components/frame/header';
import { usePageKeys } from '@/components/frame/page-keys';
import { Place } from '@/components/frame/place';
import { type Search } from '@/components/frame/search-catalogue';
import { SearchBox } from '@/components/frame/search-box';
import { SectionRow } from '@/components/frame/section-row';
import { SheetWithEvidence } from '@/components/frame/sheet-with-evidence';
import { exampleWorks } from './example-data';

const reviewKeys = [
  { keys: 'S', does: 'Same work' },
  { keys: 'D', does: 'Different works' },
  { keys: 'U', does: 'Undo' },
];

const searchExamples: Search = async (query) => ({
  works: exampleWorks.filter((work) => work.title.toLowerCase().includes(query.toLowerCase())).map((work) => ({ id: work.id, title: work.title, subtitle: work.authors, href: `/components?evidence=${work.id}` })),
  portfolios: 'freshwater ecology 2016–2025'.includes(query.toLowerCase()) ? [{ id: '1', title: 'Freshwater Ecology 2016–2025', href: '/components' }] : [],
});

export function ExampleFrame({ children }: { children: ReactNode }) {
  usePageKeys('In the review', reviewKeys);
  return (
    <>
      <Header person={{ name: 'Maren Oduya', email: 'maren.oduya@tarnholm.example' }} signOut={async (state) => state} search={<SearchBox search={searchExamples} />} />
      <main id="main">
        <Place items={[{ label: 'Portfolios', href: '/portfolios' }, { label: 'Freshwater Ecology 2016–2025' }]} />
        <SectionRow label="Freshwater Ecology 2016–2025" items={examplePortfolio} />
        <SheetWithEvidence evidence={<ExampleEvidence />}>
          <div className="grid gap-12">{children}</div>
        </SheetWithEvidence>
      </main>
    </>
  );
}
