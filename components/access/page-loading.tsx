import { Skeleton } from '@/components/ui/status';

/** Keeps the layout still while a page is on its way. */
export function PageLoading() {
  return (
    <div className="grid gap-4 px-4 py-6 sm:px-7" aria-busy="true">
      <p role="status" className="sr-only">
        Loading
      </p>
      <Skeleton className="h-9 w-64 max-w-full" />
      <Skeleton className="h-40 max-w-3xl" />
    </div>
  );
}
