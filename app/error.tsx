'use client';

import { Brand } from '@/components/frame/brand';
import { Button } from '@/components/ui/button';

/** What a person sees when a page fails unexpectedly: what happened, what was kept, what to do. */
export default function PageError({ error, reset }: { error: Error & { digest?: string }; reset: () => void }) {
  return (
    <main id="main" className="mx-auto grid max-w-[36rem] gap-3 px-6 py-24">
      <div className="mb-6"><Brand /></div>
      <h1 className="text-title">This page could not be shown</h1>
      <p>Something went wrong on our side. Nothing was lost: what you had saved is kept.</p>
      {error.digest && <p className="text-ink-soft">Tell your administrator this number: <span className="font-mono text-small">{error.digest}</span></p>}
      <p>
        <Button kind="primary" onClick={reset}>Try again</Button>
      </p>
    </main>
  );
}
