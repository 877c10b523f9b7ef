'use client';

import { Button } from '@/components/ui/button';

/** What a page shows that could not be drawn. The number is the one under which the server logged the error. */
export function PageProblem({ digest, retry }: { digest: string | undefined; retry: () => void }) {
  return (
    <div role="alert" className="grid max-w-prose justify-items-start gap-4 px-4 py-6 sm:px-7">
      <h1 className="text-[31px] leading-[35px]">This page could not be shown</h1>
      <p>Something went wrong on our side. Nothing that was saved is lost.{digest && ` If it happens again, tell your administrator this number: ${digest}.`}</p>
      <Button kind="primary" onClick={retry}>
        Try again
      </Button>
    </div>
  );
}
