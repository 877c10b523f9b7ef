'use client';

import { type ComponentProps } from 'react';

import { useEvidence } from '@/components/analyses/use-analyses';
import { workName } from '@/components/analyses/work-name';
import { EvidencePanel } from '@/components/evidence/evidence-panel';
import { EvidenceSection } from '@/components/evidence/evidence-parts';
import { type Neighbour } from '@/components/map/map-state';
import { isUncertain } from '@/components/map/threads';
import { Button, ButtonLink } from '@/components/ui/button';
import { ClusterSwatch } from '@/components/ui/cluster-swatch';
import { DefinitionList } from '@/components/ui/definition-list';
import { formatDecimal, formatNumber, formatShare } from '@/components/ui/numbers';
import { Caution, Pill } from '@/components/ui/status';
import { type AnalysisMap } from '@/lib/api/types';
import { type Basis } from '@/lib/network/types';

interface WorkPanelProps {
  map: AnalysisMap;
  work: number;
  neighbours: readonly Neighbour[];
  link: (changes: Record<string, string | null>) => Pick<ComponentProps<'a'>, 'href' | 'onClick'>;
  onSelect: (work: number) => void;
  onCentre: () => void;
  onClose: () => void;
}

const nearestWords: Record<Basis, string> = { cocitation: 'Nearest by being cited together', coupling: 'Nearest by shared references', citation: 'Linked by citations' };
const mostNearest = 6;

/** The selected work: where it stands, in which cluster and how firmly, and what lies nearest. */
export function WorkPanel({ map, work, neighbours, link, onSelect, onCentre, onClose }: WorkPanelProps) {
  const id = map.ids[work];
  const { data: evidence } = useEvidence(map.analysisId, { work: id, measure: 'pageRank', pageSize: 1 });
  const cluster = map.clusters.find((one) => one.number === map.cluster[work]);
  const firmness = map.firmness[work];
  const interval = evidence?.rank && evidence.rank.low !== evidence.rank.high ? ` (${formatNumber(evidence.rank.low)}–${formatNumber(evidence.rank.high)})` : '';
  const facts = [map.titles[work] === null ? null : map.authors[work], map.titles[work] === null ? null : map.years[work], map.catalogued[work] ? null : 'cited only'].filter((part) => part !== null).join(' · ');
  return (
    <EvidencePanel panelKey={id} eyebrow="Selected work" title={workName({ title: map.titles[work], authors: map.authors[work], year: map.years[work] })} facts={<>{facts} {map.retracted[work] && <Pill tone="problem">Retracted</Pill>}</>} onClose={onClose}>
      <EvidenceSection title="In this network">
        <DefinitionList
          items={[
            { label: 'Rank by PageRank', value: <a {...link({ evidence: `pageRank:${id}` })}>{formatNumber(map.rank[work])}{interval}</a> },
            { label: 'Citations here', value: <a {...link({ evidence: `inDegree:${id}` })}>{formatNumber(map.size[work])}</a> },
            { label: 'Cluster', value: cluster ? <ClusterSwatch index={cluster.number} letter={cluster.letter} uncertain={isUncertain(firmness)} /> : 'none' },
            ...(cluster && firmness !== null ? [{ label: 'Firmness', value: <span className="font-normal">with its cluster in {formatShare(firmness)} of repeats</span> }] : []),
          ]}
        />
        {isUncertain(firmness) && <Caution href="/methods#firmness">It stands between clusters: other repeats put it elsewhere.</Caution>}
      </EvidenceSection>
      <EvidenceSection title={nearestWords[map.basis]}>
        {neighbours.length === 0 ? (
          <p className="text-table text-ink-soft">No drawn link leads to a work that is shown.</p>
        ) : (
          <ul className="grid gap-1.5 text-table">
            {neighbours.slice(0, mostNearest).map((near) => (
              <li key={near.work} className="flex items-baseline justify-between gap-4">
                <button type="button" onClick={() => onSelect(near.work)} className="min-h-6 min-w-0 text-left hover:text-indigo hover:underline">
                  {map.retracted[near.work] && 'Retracted: '}
                  {workName({ title: map.titles[near.work], authors: map.authors[near.work], year: map.years[near.work] })}
                </button>
                <span className="font-semibold">{map.basis === 'citation' ? '' : formatDecimal(near.weight)}</span>
              </li>
            ))}
          </ul>
        )}
      </EvidenceSection>
      <div className="flex flex-wrap gap-2">
        <ButtonLink kind="primary" href={`/works/${id}`}>Open work</ButtonLink>
        <Button onClick={onCentre}>Centre</Button>
      </div>
    </EvidencePanel>
  );
}
