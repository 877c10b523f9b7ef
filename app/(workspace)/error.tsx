'use client';

import { PageProblem } from '@/components/access/page-problem';

export default function WorkspaceError({ error, reset }: { error: Error & { digest?: string }; reset: () => void }) {
  return <PageProblem digest={error.digest} retry={reset} />;
}
