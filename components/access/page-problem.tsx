'use client';

/** What a page shows that could not be drawn. The number is the one under which the server logged the error. */
export function PageProblem({ digest, retry }: { digest: string | undefined; retry: () => void }) {
  return (
    <div role="alert" className="grid max-w-prose justify-items-start gap-4 px-4 py-6 sm:px-7">
      <h1 className="font-serif text-[31px] leading-[35px]">This page could not be shown</h1>
      <p>Something went wrong on our side. Nothing that was saved is lost.{digest && ` If it happens again, tell your administrator this number: ${digest}.`}</p>
      <button type="button" onClick={retry} className="rounded-sm border border-indigo bg-indigo px-4 py-1.5 font-semibold text-on-indigo">
        Try again
      </button>
    </div>
  );
}
