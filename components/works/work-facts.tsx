import { type ReactNode } from 'react';

import { placeWords, typeWords, webAddress } from '@/components/works/work-words';
import { type WorkDetail } from '@/lib/api/types';

const identifierWords: Record<string, string> = { doi: 'DOI', pmid: 'PMID', pmcid: 'PMCID', arxiv: 'arXiv', issn: 'ISSN', isbn: 'ISBN', accession: 'Source’s own id' };

/** Everything known of the work that is not in its heading. */
export function WorkFacts({ work }: { work: WorkDetail }) {
  const address = webAddress(work.url);
  const identifiers = Object.entries(work.identifiers).filter(([name, value]) => name !== 'doi' && (Array.isArray(value) ? value.length > 0 : Boolean(value)));
  const facts: [string, ReactNode][] = [
    ['Type', typeWords[work.type]],
    ...(work.venue ? [['Published in', [work.venue, placeWords(work)].filter(Boolean).join(' ')] as [string, ReactNode]] : []),
    ...(work.publisher ? [['Publisher', work.publisher] as [string, ReactNode]] : []),
    ...(work.doi ? [['DOI', <a key="doi" href={`https://doi.org/${encodeURI(work.doi)}`} rel="external noreferrer" className="font-mono text-[13px] break-all">{work.doi}</a>] as [string, ReactNode]] : []),
    ...identifiers.map(([name, value]): [string, ReactNode] => [identifierWords[name] ?? name, <span key={name} className="font-mono text-[13px] break-all">{Array.isArray(value) ? value.join(', ') : value}</span>]),
    ...(work.language ? [['Language', work.language] as [string, ReactNode]] : []),
    ...(address ? [['Address', <a key="url" href={address} rel="external noreferrer" className="text-[14px] break-all">{address}</a>] as [string, ReactNode]] : []),
    ...(work.keywords.length > 0 ? [['Keywords', work.keywords.join('; ')] as [string, ReactNode]] : []),
  ];
  return (
    <dl className="grid gap-x-6 gap-y-1.5 text-[14.5px] sm:grid-cols-[8rem_minmax(0,1fr)]">
      {facts.map(([label, value]) => (
        <div key={label} className="contents">
          <dt className="text-[13px] leading-[22px] font-semibold text-ink-soft">{label}</dt>
          <dd className="[overflow-wrap:anywhere]">{value}</dd>
        </div>
      ))}
    </dl>
  );
}
