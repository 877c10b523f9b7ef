'use client';

import { useRouter } from 'next/navigation';
import { useState } from 'react';

import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/status';
import { messageOf, send } from '@/lib/api/client';
import { type PortfolioView } from '@/lib/api/types';

/** Says that a portfolio was deleted, and brings it back. The address carries which, so a reload does not lose the way back. */
export function DeletedNotice({ portfolioId, name }: { portfolioId: string; name: string }) {
  const router = useRouter();
  const [problem, setProblem] = useState<string | null>(null);
  const undo = async () => {
    try {
      await send<PortfolioView>('POST', `/api/portfolios/${portfolioId}/restore`);
      router.push(`/portfolios/${portfolioId}`);
    } catch (error) {
      setProblem(messageOf(error));
    }
  };
  return (
    <Notice tone={problem ? 'problem' : 'done'} title={problem ?? `${name} was deleted`} actions={<Button onClick={undo}>Undo</Button>}>
      {problem ? null : 'Its works, imports and analyses are kept. It can be brought back here.'}
    </Notice>
  );
}
