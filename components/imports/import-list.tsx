'use client';

import { ImportRows } from '@/components/imports/import-rows';
import { UploadZone } from '@/components/imports/upload-zone';
import { Pagination } from '@/components/ui/pagination';
import { EmptyState, Notice } from '@/components/ui/status';
import { useAddress } from '@/components/ui/use-address';
import { useImports } from '@/lib/api/hooks';
import { type Page } from '@/lib/api/schemas';
import { type ImportView } from '@/lib/api/types';

interface ImportListProps {
  portfolioId: string;
  initial: Page<ImportView>;
  mayUpload: boolean;
}

/** Uploads and what became of them; looks again every second as long as something moves. */
export function ImportList({ portfolioId, initial, mayUpload }: ImportListProps) {
  const { data = initial, error, mutate } = useImports(portfolioId, { page: initial.page, pageSize: initial.pageSize }, { fallbackData: initial });
  const { href } = useAddress();
  return (
    <>
      {mayUpload && <UploadZone portfolioId={portfolioId} onArrived={mutate} />}
      {error && <Notice tone="problem" title="The list could not be renewed">{error.message}</Notice>}
      {data.total > 0 ? (
        <>
          <ImportRows imports={data.items} />
          <Pagination page={data.page} pageSize={data.pageSize} total={data.total} hrefOf={({ page }) => href({ page: page === 1 ? null : page })} />
        </>
      ) : (
        <EmptyState title="Nothing was imported yet">
          {mayUpload ? 'Drop the export of a reference manager or of a database above. You will see what it holds before anything is catalogued.' : 'A librarian who contributes to this portfolio can upload reference exports.'}
        </EmptyState>
      )}
    </>
  );
}
