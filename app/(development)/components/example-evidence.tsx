'use client';

import { exampleWorks, exampleYears } from './example-data';
import { YearBars } from '@/components/charts/year-bars';
import { EvidencePanel } from '@/components/evidence/evidence-panel';
import { EvidenceCaution, EvidenceCoverage, EvidenceMethod, EvidenceRows, EvidenceSection, FileLines } from '@/components/evidence/evidence-parts';
import { useAddress } from '@/components/ui/use-address';

export function ExampleEvidence() {
  const { search } = useAddress();
  const key = search.get('evidence');
  if (key === 'loading') return <EvidencePanel panelKey={key} title="164 citations here" loading />;
  if (key === 'problem') return <EvidencePanel panelKey={key} title="164 citations here" problem="The service could not be reached. Nothing is lost; check the connection and try again." onRetry={() => undefined} />;
  const work = exampleWorks.find((one) => one.id === key);
  if (!key || !work) return null;
  return (
    <EvidencePanel panelKey={key} title={`${work.citations} citations here`} subject={work.title}>
      <EvidenceRows
        rows={[
          { label: 'Distinct catalogued works citing it', value: '164' },
          { label: 'References behind them', value: '171' },
          { label: 'Same-author citations among them', value: '9' },
          { label: 'Linked by DOI / fields / similarity', value: '133 / 27 / 4' },
        ]}
      />
      <EvidenceSection title="Where the references were read">
        <FileLines
          lines={[
            { file: 'coastal-2024.ris', line: 10482, href: '?evidence=3' },
            { file: 'coastal-2024.ris', line: 11006 },
            { file: 'estuaries.bib', line: 733, text: 'Ostrakova V, 2012, J LITTORAL STUD, V38, P114' },
          ]}
          more={{ count: 161, href: '?evidence=3' }}
        />
      </EvidenceSection>
      <EvidenceSection title="Citing works by year">
        <YearBars compact title="Citing works by year" values={exampleYears} />
      </EvidenceSection>
      <EvidenceMethod href="/methods#citations">In-degree of the citation network, duplicate references of one record counted once.</EvidenceMethod>
      <EvidenceCoverage withReferences={0.93} linked={0.87} />
      <EvidenceCaution>Counts show use within this portfolio, not quality.</EvidenceCaution>
    </EvidencePanel>
  );
}
