/** Keeps the layout still while a page is on its way. */
export function PageLoading() {
  return (
    <div className="grid gap-4 px-4 py-6 sm:px-7" aria-busy="true">
      <p role="status" className="sr-only">
        Loading
      </p>
      <div className="h-9 w-64 max-w-full rounded-sm bg-thread motion-safe:animate-pulse" />
      <div className="h-40 max-w-3xl rounded-sm bg-thread/60 motion-safe:animate-pulse" />
    </div>
  );
}
