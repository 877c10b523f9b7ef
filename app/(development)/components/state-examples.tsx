import { Progress } from '@/components/ui/progress';
import { Button } from '@/components/ui/button';
import { ClusterSwatch } from '@/components/ui/cluster-swatch';
import { DateText, RelativeTime } from '@/components/ui/date-text';
import { FactList } from '@/components/ui/definition-list';
import { PageHeader, SectionHeading } from '@/components/ui/page-header';
import { EmptyState, Notice, Pill, PillLink, Skeleton } from '@/components/ui/status';
import { Tabs } from '@/components/ui/tabs';

const clusters = ['Peat carbon under drainage', 'Macroinvertebrate recovery', 'Managed realignment', 'Reed-bed nutrient uptake', 'Flume wave attenuation', 'Soil respiration models', 'Lake sediment cores', 'Riparian shade', 'Fish passage', 'Groundwater seeps', 'Beyond the tenth'];

export function StateExamples() {
  return (
    <section aria-label="States" className="grid gap-5">
      <PageHeader title="States" />
      <SectionHeading beside="of an import" actions={<Button>Set aside</Button>}>coastal-2024.ris</SectionHeading>
      <Progress label="Linking references" done={61} total={100} detail="Linking references, 58,684 of 96,204, about 2 minutes left. You can leave this page." />
      <Progress label="Read" done={100} total={100} still detail="Read, 2,310 records" />
      <Progress label="Waiting" done={0} total={0} detail="Waiting for the worker" />
      <p className="flex flex-wrap gap-2">
        <Pill tone="done">1,874 new</Pill>
        <Pill>402 already catalogued</Pill>
        <Pill tone="caution">27 to review</Pill>
        <Pill tone="problem">7 problems</Pill>
        <PillLink tone="caution" href="?outcome=review" current>27 to review</PillLink>
      </p>
      <Tabs label="Basis" tabs={[{ href: '?basis=coupling', label: 'By shared references', count: '6', current: true }, { href: '?basis=cocitation', label: 'By being cited together', count: '8', current: false }]} />
      <Notice tone="done" title="Import accepted" actions={<Button>Undo</Button>}>2,276 works are in the portfolio.</Notice>
      <Notice tone="caution" title="The catalogue has changed">The check is run again.</Notice>
      <Notice tone="problem" title="The file could not be read to its end">Line 9,002: ER missing. The 2,303 records before it are kept.</Notice>
      <EmptyState title="No import yet" action={<Button kind="primary">Choose files</Button>}>Drop reference exports here: BibTeX, RIS, CSL-JSON and others.</EmptyState>
      <FactList
        items={[
          { label: 'DOI', value: <span className="font-mono text-small">10.5555/jls.2012.0382</span> },
          { label: 'Analysed', value: <DateText at="2026-05-14T08:30:00Z" withTime /> },
          { label: 'Last import', value: <RelativeTime at="2026-05-14T08:30:00Z" /> },
        ]}
      />
      <ul className="flex flex-wrap gap-x-6 gap-y-1.5">
        {clusters.map((name, index) => <li key={name}><ClusterSwatch index={index} name={name} uncertain={index === 6} /></li>)}
        <li><ClusterSwatch index={null} /></li>
      </ul>
      <div className="grid max-w-sm gap-2"><Skeleton className="h-4" /><Skeleton className="h-4 w-2/3" /></div>
    </section>
  );
}
