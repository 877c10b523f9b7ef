'use client';

import Link from 'next/link';
import { usePathname } from 'next/navigation';
import { useEffect, useRef } from 'react';

export interface SectionItem {
  href: string;
  label: string;
}

/** The item whose address is the longest beginning of the path; the first one ("Overview") thus never wins over its neighbours. */
export function currentSection(path: string, items: readonly SectionItem[]): string | null {
  const fitting = items.filter((item) => path === item.href || path.startsWith(`${item.href}/`));
  return fitting.reduce<string | null>((best, item) => (best === null || item.href.length > best.length ? item.href : best), null);
}

/** The row of sections below the header; the current one is underlined in madder. On narrow screens it scrolls, with the current one in view. */
export function SectionRow({ label, items }: { label: string; items: readonly SectionItem[] }) {
  const path = usePathname();
  const current = currentSection(path, items);
  const row = useRef<HTMLElement>(null);
  useEffect(() => {
    const link = row.current?.querySelector<HTMLElement>('[aria-current]');
    if (row.current && link) row.current.scrollLeft = link.offsetLeft - (row.current.clientWidth - link.offsetWidth) / 2;
  }, [current]);
  return (
    <nav ref={row} aria-label={label} className="no-print scrollbar-none relative overflow-x-auto border-b border-thread px-2 md:px-4">
      <ul className="flex">
        {items.map((item) => (
          <li key={item.href}>
            <Link
              href={item.href}
              aria-current={item.href === current ? (path === item.href ? 'page' : 'true') : undefined}
              className="focus-inset group block px-2 text-ink-soft no-underline hover:text-ink aria-[current]:text-ink md:px-3"
            >
              <span className="block border-b-2 border-transparent pt-3 pb-2.5 whitespace-nowrap group-aria-[current]:border-madder group-aria-[current]:font-semibold">{item.label}</span>
            </Link>
          </li>
        ))}
      </ul>
    </nav>
  );
}

/** The row outside a portfolio (Portfolios, Administration ... by role). Inside one it steps aside for the portfolio's own sections. */
export function MainRow({ items }: { items: readonly SectionItem[] }) {
  const path = usePathname();
  return /^\/portfolios\/[^/]+/.test(path) ? null : <SectionRow label="Main" items={items} />;
}
