import { exampleBins, exampleYears } from './example-data';
import { DistributionStrip } from '@/components/charts/distribution-strip';
import { YearBars } from '@/components/charts/year-bars';
import { PageHeader } from '@/components/ui/page-header';

export function ChartExamples() {
  return (
    <section aria-label="Charts" className="grid max-w-3xl gap-6">
      <PageHeader title="Charts" />
      <YearBars title="When did the citing works appear?" values={exampleYears} unit={['citing work', 'citing works']} />
      <YearBars title="When did the works appear?" values={exampleYears} tone="linen" />
      <DistributionStrip title="How are citations spread over the works?" axis="citations here" bins={exampleBins} mark={{ value: 164, label: 'this work, 164' }} />
    </section>
  );
}
