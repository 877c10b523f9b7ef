'use client';

/** What a person sees when a page fails unexpectedly: what happened, what was kept, what to do. */
export default function PageError({ error, reset }: { error: Error & { digest?: string }; reset: () => void }) {
  return (
    <main id="main" className="mx-auto grid max-w-[36rem] gap-3 px-6 py-24">
      <h1 className="text-[31px] leading-[35px]">This page could not be shown</h1>
      <p>Something went wrong on our side. Nothing was lost: what you had saved is kept.</p>
      {error.digest && <p className="text-ink-soft">Tell your administrator this number: <span className="font-mono text-[13px]">{error.digest}</span></p>}
      <p>
        <button type="button" onClick={reset} className="rounded-sm border border-indigo bg-indigo px-4 py-2 font-semibold text-on-indigo">
          Try again
        </button>
      </p>
    </main>
  );
}
