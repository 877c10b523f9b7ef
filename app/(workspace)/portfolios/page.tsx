import { type Metadata } from 'next';

import { PageLinks } from '@/components/access/page-links';
import { SearchForm } from '@/components/access/search-form';
import { DeletedNotice } from '@/components/portfolios/deleted-notice';
import { NewPortfolio } from '@/components/portfolios/new-portfolio';
import { PortfolioList } from '@/components/portfolios/portfolio-list';
import { PageHeader } from '@/components/ui/page-header';
import { EmptyState } from '@/components/ui/status';
import { actorForPage } from '@/lib/access/actor';
import { roleMay } from '@/lib/access/permissions';
import { unitTree } from '@/lib/access/units';
import { queryOfPage, type PageSearch } from '@/lib/api/page-query';
import { deletedPortfolio, listPortfolios, portfoliosQuery } from '@/lib/portfolios/portfolios';

export const metadata: Metadata = { title: 'Portfolios' };

/** The portfolios that this person was given. */
export default async function PortfoliosPage({ searchParams }: { searchParams: PageSearch }) {
  const actor = await actorForPage();
  const { deleted, ...search } = await searchParams;
  const query = queryOfPage(portfoliosQuery, search);
  const [list, gone] = await Promise.all([listPortfolios(actor, query), deletedPortfolio(actor, deleted)]);
  const mayCreate = roleMay(actor.role, 'portfolio.create');
  const units = mayCreate ? await unitTree() : [];
  return (
    <div className="grid gap-5 px-4 pt-6 pb-12 md:px-7">
      {gone && <DeletedNotice portfolioId={gone.id} name={gone.name} />}
      <PageHeader title="Portfolios" actions={mayCreate && list.total > 0 && <NewPortfolio units={units} />} />
      {(list.total > 0 || query.q) && <SearchForm label="Find a portfolio by name or purpose" q={query.q} />}
      {list.total > 0 ? (
        <>
          <PortfolioList portfolios={list.items} />
          <PageLinks path="/portfolios" query={{ q: query.q }} page={list.page} pageSize={list.pageSize} total={list.total} />
        </>
      ) : query.q ? (
        <EmptyState title="No portfolio is called that">You see the portfolios that you were given.</EmptyState>
      ) : (
        <EmptyState title="No portfolio yet" action={mayCreate ? <NewPortfolio units={units} /> : undefined}>
          {mayCreate ? 'A portfolio holds the works of a unit, a project or a question. Make one, then import what you have: reference exports in BibTeX, RIS and other formats.' : 'You have not been given a portfolio. A librarian of your institution can give you one.'}
        </EmptyState>
      )}
    </div>
  );
}
