import Link from 'next/link';

interface PageLinksProps {
  /** The list's own address with its filters, without the page. */
  path: string;
  query?: Record<string, string | undefined>;
  page: number;
  pageSize: number;
  total: number;
}

/** "51 to 100 of 230", with links to the pages before and after; the page stands in the address. */
export function PageLinks({ path, query = {}, page, pageSize, total }: PageLinksProps) {
  const first = (page - 1) * pageSize + 1;
  const last = Math.min(page * pageSize, total);
  const address = (target: number) => {
    const search = new URLSearchParams(Object.entries(query).flatMap(([name, value]) => (value ? [[name, value]] : [])));
    if (target > 1) search.set('page', String(target));
    return search.size === 0 ? path : `${path}?${search}`;
  };
  if (total <= pageSize && page === 1) return null;
  return (
    <nav aria-label="Pages" className="flex flex-wrap items-center gap-4">
      <p className="text-ink-soft">{first > total ? `Nothing on this page; there are ${total} in all` : `${first} to ${last} of ${total}`}</p>
      {page > 1 && (
        <Link href={address(page - 1)} rel="prev" className="text-indigo underline underline-offset-2">
          Page before
        </Link>
      )}
      {last < total && (
        <Link href={address(page + 1)} rel="next" className="text-indigo underline underline-offset-2">
          Next page
        </Link>
      )}
    </nav>
  );
}
