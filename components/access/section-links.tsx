'use client';

import Link from 'next/link';
import { usePathname } from 'next/navigation';

/** The row of sections below the header; the one that is open is underlined and said to be current. */
export function SectionLinks({ label, sections }: { label: string; sections: { href: string; label: string }[] }) {
  const path = usePathname();
  return (
    <nav aria-label={label} className="overflow-x-auto border-b border-thread px-2 sm:px-5">
      <ul className="flex">
        {sections.map((section) => (
          <li key={section.href}>
            <Link
              href={section.href}
              aria-current={path === section.href ? 'page' : undefined}
              className="block border-b-2 border-transparent px-2 py-2.5 whitespace-nowrap text-ink-soft aria-[current=page]:border-madder aria-[current=page]:font-semibold aria-[current=page]:text-ink"
            >
              {section.label}
            </Link>
          </li>
        ))}
      </ul>
    </nav>
  );
}
