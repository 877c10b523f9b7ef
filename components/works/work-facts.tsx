import Link from 'next/link';
import { type ReactNode } from 'react';

import { FactList } from '@/components/ui/definition-list';
import { placeWords, typeWords, webAddress } from '@/components/works/work-words';
import { type WorkDetail } from '@/lib/api/types';

const identifierWords: Record<string, string> = { doi: 'DOI', pmid: 'PMID', pmcid: 'PMCID', arxiv: 'arXiv', issn: 'ISSN', isbn: 'ISBN', accession: 'Source’s own id' };

/** Everything known of the work that is not in its heading. */
export function WorkFacts({ work }: { work: WorkDetail }) {
  const address = webAddress(work.url);
  const identifiers = Object.entries(work.identifiers).filter(([name, value]) => name !== 'doi' && (Array.isArray(value) ? value.length > 0 : Boolean(value)));
  const facts: [string, ReactNode][] = [
    ['Kind', `${work.catalogued ? 'catalogued' : 'cited-only'} work, ${typeWords[work.type]}`],
    ...(work.venue ? [['Published in', [work.venue, placeWords(work)].filter(Boolean).join(' ')] as [string, ReactNode]] : []),
    ...(work.publisher ? [['Publisher', work.publisher] as [string, ReactNode]] : []),
    ...(work.doi ? [['DOI', <a key="doi" href={`https://doi.org/${encodeURI(work.doi)}`} rel="external noreferrer" className="font-mono text-small break-all">{work.doi}</a>] as [string, ReactNode]] : []),
    ...identifiers.map(([name, value]): [string, ReactNode] => [identifierWords[name] ?? name, <span key={name} className="font-mono text-small break-all">{Array.isArray(value) ? value.join(', ') : value}</span>]),
    ...(work.language ? [['Language', work.language] as [string, ReactNode]] : []),
    ...(address ? [['Address', <a key="url" href={address} rel="external noreferrer" className="text-table break-all">{address}</a>] as [string, ReactNode]] : []),
    ...(work.portfolios.length > 0 ? [['Portfolios', <span key="portfolios" className="flex flex-wrap gap-x-4">{work.portfolios.map((portfolio) => <Link key={portfolio.id} href={`/portfolios/${portfolio.id}`}>{portfolio.name}</Link>)}</span>] as [string, ReactNode]] : []),
    ...(work.keywords.length > 0 ? [['Keywords', work.keywords.join('; ')] as [string, ReactNode]] : []),
  ];
  return <FactList items={facts.map(([label, value]) => ({ label, value }))} />;
}
