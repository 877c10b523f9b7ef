'use client';

import Link from 'next/link';

import { EvidencePanel } from '@/components/evidence/evidence-panel';
import { SheetWithEvidence } from '@/components/frame/sheet-with-evidence';
import { formatWords } from '@/components/imports/import-words';
import { count, formatDecimal, formatNumber } from '@/components/ui/numbers';
import { PageHeader, SectionHeading } from '@/components/ui/page-header';
import { Caution, Notice } from '@/components/ui/status';
import { Cell, ColumnHead, RowHead, Table, TableBody, TableHead } from '@/components/ui/table';
import { useAddress } from '@/components/ui/use-address';
import { PagedSection } from '@/components/works/paged-section';
import { RawRecord } from '@/components/works/raw-record';
import { WorkFacts } from '@/components/works/work-facts';
import { WorkLine } from '@/components/works/work-line';
import { linkWords, titleOf } from '@/components/works/work-words';
import { useCitingWorks, useWorkReferences } from '@/lib/api/hooks';
import { type Page } from '@/lib/api/schemas';
import { type WorkDetail, type WorkListItem, type WorkReferenceView } from '@/lib/api/types';

function Records({ work, chosen }: { work: WorkDetail; chosen: string | null }) {
  const { href } = useAddress();
  return (
    <section id="records" aria-labelledby="records-title" className="grid scroll-mt-4 gap-2">
      <SectionHeading id="records-title" beside={formatNumber(work.records.length + work.hiddenRecords)}>Records it stands on</SectionHeading>
      {work.records.length > 0 && (
        <ul className="-mt-2 divide-y divide-thread border-b border-thread">
          {work.records.map((record) => (
            <li key={record.id} className={`flex flex-wrap items-baseline justify-between gap-x-4 gap-y-1 py-2 ${chosen === record.id ? 'bg-weld-wash' : ''}`}>
              <Link prefetch={false} href={href({ evidence: `record-${record.id}` })} scroll={false} className="font-mono text-small break-all">{record.fileName} <span className="whitespace-nowrap">line {formatNumber(record.line)}</span></Link>
              <span className="text-small text-ink-soft">{[record.format && (formatWords[record.format] ?? record.format), count(record.references, 'reference')].filter(Boolean).join(', ')}</span>
            </li>
          ))}
        </ul>
      )}
      {work.hiddenRecords > 0 && <p className="text-table text-ink-soft">{count(work.hiddenRecords, 'record')} {work.hiddenRecords === 1 ? 'stands' : 'stand'} in files of portfolios that you were not given.</p>}
      {work.records.length + work.hiddenRecords === 0 && <p className="text-ink-soft">No record stands on it: it is known because catalogued works cite it.</p>}
    </section>
  );
}

function Standings({ work }: { work: WorkDetail }) {
  if (work.standings.length === 0) return null;
  return (
    <section aria-labelledby="standings-title" className="grid gap-3">
      <SectionHeading id="standings-title">Where it stands</SectionHeading>
      <Table caption="In the latest analysis of each portfolio">
        <TableHead>
          <ColumnHead>Portfolio</ColumnHead>
          <ColumnHead numeric>Rank by PageRank</ColumnHead>
          <ColumnHead numeric>PageRank (mean 1)</ColumnHead>
          <ColumnHead numeric>Citations here</ColumnHead>
        </TableHead>
        <TableBody>
          {work.standings.map((standing) => (
            <tr key={standing.analysisId}>
              <RowHead><Link prefetch={false} href={`/portfolios/${standing.portfolioId}/rankings`}>{standing.portfolioName}</Link></RowHead>
              <Cell numeric>{formatNumber(standing.rank)} <span className="text-small text-ink-soft">({formatNumber(standing.rankLow)}–{formatNumber(standing.rankHigh)})</span></Cell>
              <Cell numeric>{formatDecimal(standing.pageRank)}</Cell>
              <Cell numeric>{formatNumber(standing.inDegree)}</Cell>
            </tr>
          ))}
        </TableBody>
      </Table>
      <Caution>Ranks show use within a portfolio, not quality; read them with their intervals. Not for decisions on persons.</Caution>
    </section>
  );
}

const nameOf = (name: WorkDetail['authors'][number]) => [name.given, name.particle, name.family ?? name.literal].filter(Boolean).join(' ');

interface WorkPageProps {
  work: WorkDetail;
  references: Page<WorkReferenceView>;
  citing: Page<WorkListItem>;
}

/** Everything about one work: what is known of it, on which records it stands, what it cites and what cites it. */
export function WorkPage({ work, references, citing }: WorkPageProps) {
  const { search, href } = useAddress();
  const pageOf = (name: string) => Math.max(1, Number(search.get(name) ?? 1) || 1);
  const [referencePage, citingPage] = [pageOf('references'), pageOf('citing')];
  const { data: cites = references, error: citesError } = useWorkReferences(work.id, { page: referencePage, pageSize: references.pageSize }, { fallbackData: referencePage === references.page ? references : undefined });
  const { data: cited = citing, error: citedError } = useCitingWorks(work.id, { page: citingPage, pageSize: citing.pageSize }, { fallbackData: citingPage === citing.page ? citing : undefined });
  const record = work.records.find((one) => `record-${one.id}` === search.get('evidence')) ?? null;
  const authors = work.authors.length === 0 || work.authors.length > 12 ? work.authorsLabel : work.authors.map(nameOf).join(', ');
  const pageHref = (name: string, page: number | undefined) => href({ [name]: page === 1 ? null : page });
  return (
    <SheetWithEvidence
      evidence={
        record && (
          <EvidencePanel panelKey={`record-${record.id}`} eyebrow="The record as it was read" title={work.title ?? 'No title'}>
            <RawRecord fileName={record.fileName} line={record.line} raw={record.raw} />
          </EvidencePanel>
        )
      }
    >
      <article className="grid max-w-[60rem] gap-8">
        <PageHeader title={titleOf({ title: work.title, authors: work.authorsLabel, year: work.year })} subtitle={[authors, work.year].filter(Boolean).join(' · ')}>
          {work.retracted && <Notice tone="problem" title="Retracted">A record says that this work was withdrawn. It stays in the network, because it was cited, and is marked wherever it appears.</Notice>}
        </PageHeader>
        <WorkFacts work={work} />
        {work.abstract && (
          <section aria-label="Abstract" className="max-w-[44rem]">
            <p className="whitespace-pre-line [overflow-wrap:anywhere]">{work.abstract}</p>
          </section>
        )}
        <Standings work={work} />
        <Records work={work} chosen={record?.id ?? null} />
        <PagedSection id="references" title="References" page={cites} error={citesError} hrefOf={({ page }) => pageHref('references', page)} itemKey={(item) => `${item.recordId}-${item.position}`}
          empty={work.catalogued ? 'Its records carry no reference list, or one that you were not given.' : 'Works known from references alone have no reference list.'}>
          {(item) => (
            <div className="grid gap-1">
              {item.work ? <WorkLine work={item.work} /> : <p>Not linked</p>}
              <p className="font-mono text-head leading-[1.125rem] text-ink-soft [overflow-wrap:anywhere]">{item.raw}</p>
              <p className="text-small text-ink-soft">{item.how ? `${linkWords[item.how] ?? item.how} · ` : ''}<span className="break-all">{item.fileName}</span> line {formatNumber(item.line)}</p>
            </div>
          )}
        </PagedSection>
        <PagedSection id="cited-by" title="Cited by" page={cited} error={citedError} hrefOf={({ page }) => pageHref('citing', page)} itemKey={(item) => item.id}
          empty={work.cited > 0 ? 'The works that cite it are in portfolios that you were not given.' : 'No catalogued work cites it.'}>
          {(item) => <WorkLine work={item} />}
        </PagedSection>
        {work.cited > cited.total && cited.total > 0 && <p className="-mt-6 text-table text-ink-soft">{count(work.cited - cited.total, 'more work')} in portfolios that you were not given {work.cited - cited.total === 1 ? 'cites' : 'cite'} it too.</p>}
      </article>
    </SheetWithEvidence>
  );
}
