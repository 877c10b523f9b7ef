import { type Metadata } from 'next';
import { notFound } from 'next/navigation';
import { Suspense } from 'react';

import { ChartExamples } from './chart-examples';
import { ControlExamples } from './control-examples';
import { ExampleFrame } from './example-frame';
import { RankingExample } from './ranking-example';
import { StateExamples } from './state-examples';
import { environment } from '@/lib/environment';

export const metadata: Metadata = { title: 'Components' };

/** Every control in every state on one page, to look at; in production it does not exist. */
export default function ComponentsPage() {
  if (environment().NODE_ENV === 'production') notFound();
  return (
    <Suspense>
      <ExampleFrame>
        <RankingExample />
        <StateExamples />
        <ControlExamples />
        <ChartExamples />
      </ExampleFrame>
    </Suspense>
  );
}
