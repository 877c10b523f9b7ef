import Link from 'next/link';

import { Mark } from '@/components/frame/mark';

/** The mark and the name, as one link to the start. */
export function Brand({ href = '/portfolios' }: { href?: string }) {
  return (
    <Link href={href} className="flex items-center gap-2.5 font-serif text-[1.5rem] leading-none font-medium text-ink no-underline">
      <Mark />
      Heddle
    </Link>
  );
}
