import { count, formatNumber } from '@/components/ui/numbers';

/** The question that the bars answer, as a title. */
function finding(years: { year: number; works: number }[]): string {
  const most = years.reduce((best, one) => (one.works > best.works ? one : best));
  return `When the works appeared: most in ${most.year}, ${count(most.works, 'work')}`;
}

/** Works by year of publication as bars; every year between first and last has its place. The numbers stand in a table below, on request. */
export function YearBars({ years, undated }: { years: { year: number; works: number }[]; undated: number }) {
  if (years.length === 0) return null;
  const first = years[0].year;
  const last = years[years.length - 1].year;
  const byYear = new Map(years.map(({ year, works }) => [year, works]));
  const all = Array.from({ length: last - first + 1 }, (_, index) => ({ year: first + index, works: byYear.get(first + index) ?? 0 }));
  const highest = Math.max(...all.map((one) => one.works));
  const slot = 100 / all.length;
  return (
    <figure className="grid gap-2">
      <figcaption className="text-table font-semibold">{finding(years)}</figcaption>
      <svg viewBox="0 0 100 30" preserveAspectRatio="none" className="h-32 w-full" aria-hidden="true">
        {all.map(({ year, works }, index) => {
          const height = (works / highest) * 29;
          return (
            <rect key={year} x={index * slot + slot * 0.1} width={slot * 0.8} y={30 - height} height={height} fill="var(--bar)">
              <title>{`${year}: ${count(works, 'work')}`}</title>
            </rect>
          );
        })}
      </svg>
      <div aria-hidden="true" className="flex justify-between border-t border-thread-strong pt-1 text-small text-ink-soft">
        <span>{first}</span>
        {last > first && <span>{last}</span>}
      </div>
      <details className="text-small text-ink-soft">
        <summary className="w-fit text-indigo underline underline-offset-2">The numbers as a table</summary>
        <table className="mt-2 border-collapse">
          <caption className="sr-only">Works by year of publication</caption>
          <thead>
            <tr><th scope="col" className="pr-6 text-left font-semibold">Year</th><th scope="col" className="text-right font-semibold">Works</th></tr>
          </thead>
          <tbody>
            {years.map(({ year, works }) => (
              <tr key={year}><th scope="row" className="pr-6 text-left font-normal">{year}</th><td className="text-right">{formatNumber(works)}</td></tr>
            ))}
            {undated > 0 && <tr><th scope="row" className="pr-6 text-left font-normal">without a year</th><td className="text-right">{formatNumber(undated)}</td></tr>}
          </tbody>
        </table>
      </details>
      {undated > 0 && <p className="text-small text-ink-soft">{count(undated, 'work')} without a year {undated === 1 ? 'is' : 'are'} not drawn.</p>}
    </figure>
  );
}
