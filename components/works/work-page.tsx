'use client';

import Link from 'next/link';

import { formatWords } from '@/components/imports/import-words';
import { PageWithPanel } from '@/components/portfolios/page-with-panel';
import { Button } from '@/components/ui/button';
import { count, formatDecimal, formatNumber } from '@/components/ui/numbers';
import { Caution, Notice } from '@/components/ui/status';
import { useAddress } from '@/components/ui/use-address';
import { PagedSection } from '@/components/works/paged-section';
import { RawRecord } from '@/components/works/raw-record';
import { WorkFacts } from '@/components/works/work-facts';
import { WorkLine } from '@/components/works/work-line';
import { linkWords, titleOf } from '@/components/works/work-words';
import { useCitingWorks, useWorkReferences } from '@/lib/api/hooks';
import { type Page } from '@/lib/api/schemas';
import { type WorkDetail, type WorkListItem, type WorkReferenceView } from '@/lib/api/types';

/** Characters at which the service cuts a raw record. */
const rawLimit = 20_000;

function Records({ work, chosen, onOpen }: { work: WorkDetail; chosen: string | null; onOpen: (id: string) => void }) {
  return (
    <section aria-labelledby="records-title" className="grid gap-2">
      <h2 id="records-title" className="border-b border-ink pb-2 text-[21px] leading-[25px]">
        Records it stands on <span className="font-sans text-[14px] text-ink-soft">{formatNumber(work.records.length + work.hiddenRecords)}</span>
      </h2>
      {work.records.length > 0 && (
        <ul className="divide-y divide-thread border-b border-thread">
          {work.records.map((record) => (
            <li key={record.id} className={`flex flex-wrap items-center justify-between gap-x-4 gap-y-1 py-2 ${chosen === record.id ? 'bg-weld-wash' : ''}`}>
              <span className="font-mono text-[13px] break-all">{record.fileName} <span className="whitespace-nowrap">line {formatNumber(record.line)}</span></span>
              <span className="flex items-center gap-3 text-[13px] text-ink-soft">
                {record.format && (formatWords[record.format] ?? record.format)}, {count(record.references, 'reference')}
                <Button kind="quiet" className="min-h-8 px-1 py-0.5 text-indigo underline" aria-label={`Show the record of ${record.fileName}, line ${record.line}`} onClick={() => onOpen(record.id)}>Show</Button>
              </span>
            </li>
          ))}
        </ul>
      )}
      {work.hiddenRecords > 0 && <p className="text-[14px] text-ink-soft">{count(work.hiddenRecords, 'record')} {work.hiddenRecords === 1 ? 'stands' : 'stand'} in files of portfolios that you were not given.</p>}
      {work.records.length + work.hiddenRecords === 0 && <p className="text-ink-soft">No record stands on it: it is known because catalogued works cite it.</p>}
    </section>
  );
}

function Standings({ work }: { work: WorkDetail }) {
  if (work.standings.length === 0) return null;
  const head = 'pb-1.5 text-[12.5px] font-semibold text-ink-soft';
  return (
    <section aria-labelledby="standings-title" className="grid gap-2">
      <h2 id="standings-title" className="border-b border-ink pb-2 text-[21px] leading-[25px]">Where it stands</h2>
      <table className="w-full border-collapse text-[14.5px]">
        <caption className="sr-only">In the latest analysis of each portfolio</caption>
        <thead>
          <tr>
            <th scope="col" className={`${head} text-left`}>Portfolio</th>
            <th scope="col" className={`${head} text-right`}>Rank by PageRank</th>
            <th scope="col" className={`${head} hidden text-right sm:table-cell`}>PageRank (mean 1)</th>
            <th scope="col" className={`${head} text-right`}>Citations here</th>
          </tr>
        </thead>
        <tbody className="divide-y divide-thread border-y border-thread">
          {work.standings.map((standing) => (
            <tr key={standing.analysisId}>
              <th scope="row" className="py-2 pr-3 text-left font-normal"><Link href={`/portfolios/${standing.portfolioId}/rankings`}>{standing.portfolioName}</Link></th>
              <td className="py-2 text-right whitespace-nowrap">{formatNumber(standing.rank)} <span className="text-[13px] text-ink-soft">({formatNumber(standing.rankLow)}–{formatNumber(standing.rankHigh)})</span></td>
              <td className="hidden py-2 text-right sm:table-cell">{formatDecimal(standing.pageRank)}</td>
              <td className="py-2 text-right">{formatNumber(standing.inDegree)}</td>
            </tr>
          ))}
        </tbody>
      </table>
      <Caution>Ranks show use within a portfolio, not quality; read them with their intervals. Not for decisions on persons.</Caution>
    </section>
  );
}

interface WorkPageProps {
  work: WorkDetail;
  references: Page<WorkReferenceView>;
  citing: Page<WorkListItem>;
}

/** Everything about one work: what is known of it, on which records it stands, what it cites and what cites it. */
export function WorkPage({ work, references, citing }: WorkPageProps) {
  const { search, go } = useAddress();
  const pageOf = (name: string) => Math.max(1, Number(search.get(name) ?? 1) || 1);
  const [referencePage, citingPage] = [pageOf('references'), pageOf('citing')];
  const { data: cites = references, error: citesError } = useWorkReferences(work.id, { page: referencePage, pageSize: references.pageSize }, { fallbackData: referencePage === references.page ? references : undefined });
  const { data: cited = citing, error: citedError } = useCitingWorks(work.id, { page: citingPage, pageSize: citing.pageSize }, { fallbackData: citingPage === citing.page ? citing : undefined });
  const record = work.records.find((one) => one.id === search.get('record')) ?? null;
  return (
    <PageWithPanel
      panel={record && { eyebrow: 'Evidence for', title: record.fileName, content: <RawRecord fileName={record.fileName} line={record.line} raw={record.raw} cut={record.raw.length >= rawLimit} /> }}
      onClose={() => go({ record: null })}
    >
      <article className="grid max-w-[60rem] gap-8">
        <header className="grid gap-2">
          <p className="flex flex-wrap items-center gap-2 text-[13px] text-ink-soft">
            {work.catalogued ? 'Catalogued work' : 'Cited-only work'}
            {work.portfolios.map((portfolio) => <Link key={portfolio.id} href={`/portfolios/${portfolio.id}`}>{portfolio.name}</Link>)}
          </p>
          <h1 className="text-[31px] leading-[35px] [overflow-wrap:anywhere]">{titleOf({ title: work.title, authors: work.authorsLabel, year: work.year })}</h1>
          <p className="text-ink-soft">{[work.authors.length > 12 ? work.authorsLabel : work.authors.map((name) => [name.given, name.particle, name.family ?? name.literal].filter(Boolean).join(' ')).join(', ') || work.authorsLabel, work.year].filter(Boolean).join(' · ')}</p>
          {work.retracted && <Notice tone="problem" title="Retracted">A record says that this work was withdrawn. It stays in the network, because it was cited, and is marked wherever it appears.</Notice>}
        </header>
        <WorkFacts work={work} />
        {work.abstract && (
          <section aria-label="Abstract" className="max-w-[44rem]">
            <p className="whitespace-pre-line [overflow-wrap:anywhere]">{work.abstract}</p>
          </section>
        )}
        <Standings work={work} />
        <Records work={work} chosen={record?.id ?? null} onOpen={(id) => go({ record: id })} />
        <PagedSection title="References" page={cites} error={citesError} onPage={(page) => go({ references: page === 1 ? null : page })} itemKey={(item) => `${item.recordId}-${item.position}`}
          empty={work.catalogued ? 'Its records carry no reference list, or one that you were not given.' : 'Works known from references alone have no reference list.'}>
          {(item) => (
            <div className="grid gap-1">
              {item.work ? <WorkLine work={item.work} /> : <p>Not linked</p>}
              <p className="font-mono text-[12.5px] leading-[18px] text-ink-soft [overflow-wrap:anywhere]">{item.raw}</p>
              <p className="text-[13px] leading-[18px] text-ink-soft">{item.how ? `${linkWords[item.how] ?? item.how} · ` : ''}<span className="break-all">{item.fileName}</span> line {formatNumber(item.line)}</p>
            </div>
          )}
        </PagedSection>
        <PagedSection title="Cited by" page={cited} error={citedError} onPage={(page) => go({ citing: page === 1 ? null : page })} itemKey={(item) => item.id}
          empty={work.cited > 0 ? 'The works that cite it are in portfolios that you were not given.' : 'No catalogued work cites it.'}>
          {(item) => <WorkLine work={item} />}
        </PagedSection>
        {work.cited > cited.total && cited.total > 0 && <p className="-mt-6 text-[14px] text-ink-soft">{count(work.cited - cited.total, 'more work')} in portfolios that you were not given {work.cited - cited.total === 1 ? 'cites' : 'cite'} it too.</p>}
      </article>
    </PageWithPanel>
  );
}
