import Link from 'next/link';

import { levelWords, periodWords } from '@/components/portfolios/level-words';
import { DateText } from '@/components/ui/date-text';
import { formatNumber } from '@/components/ui/numbers';
import { Pill } from '@/components/ui/status';
import { type PortfolioView } from '@/lib/api/types';

const head = 'px-2 pb-2 text-head font-semibold text-ink-soft first:pl-0 last:pr-0';

/** The portfolios as lines of a ledger. On narrow screens name and works stay; the rest is said below the name. */
export function PortfolioList({ portfolios }: { portfolios: PortfolioView[] }) {
  return (
    <table className="w-full border-collapse text-table">
      <caption className="sr-only">Portfolios</caption>
      <thead>
        <tr className="border-b border-ink">
          <th scope="col" className={`${head} text-left`}>Portfolio</th>
          <th scope="col" className={`${head} hidden text-left md:table-cell`}>Unit</th>
          <th scope="col" className={`${head} hidden text-left sm:table-cell`}>Period</th>
          <th scope="col" className={`${head} text-right`}>Works</th>
          <th scope="col" className={`${head} hidden text-left lg:table-cell`}>You</th>
          <th scope="col" className={`${head} hidden text-right lg:table-cell`}>Last changed</th>
        </tr>
      </thead>
      <tbody className="divide-y divide-thread">
        {portfolios.map((portfolio) => (
          <tr key={portfolio.id} className="align-baseline hover:bg-paper">
            <th scope="row" className="py-3 pr-2 text-left font-normal">
              <Link href={`/portfolios/${portfolio.id}`} className="font-serif text-work text-ink no-underline hover:underline">{portfolio.name}</Link>
              {portfolio.demonstration && <span className="ml-2"><Pill tone="caution">invented</Pill></span>}
              {portfolio.description && <p className="line-clamp-2 max-w-[44rem] text-small text-ink-soft">{portfolio.description}</p>}
              <p className="text-small text-ink-soft md:hidden">{[portfolio.unit?.name, periodWords(portfolio.periodFrom, portfolio.periodTo)].filter(Boolean).join(' · ')}</p>
            </th>
            <td className="hidden px-2 py-3 md:table-cell">{portfolio.unit?.name ?? '–'}</td>
            <td className="hidden px-2 py-3 whitespace-nowrap sm:table-cell">{periodWords(portfolio.periodFrom, portfolio.periodTo) ?? '–'}</td>
            <td className="py-3 pl-2 text-right lg:px-2">{formatNumber(portfolio.works)}</td>
            <td className="hidden px-2 py-3 text-ink-soft lg:table-cell">{levelWords[portfolio.level].replace('may ', '').replace('manages', 'manage')}</td>
            <td className="hidden py-3 pl-2 text-right text-ink-soft lg:table-cell"><DateText at={portfolio.updatedAt} /></td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}
