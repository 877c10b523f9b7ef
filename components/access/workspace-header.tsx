'use client';

import Link from 'next/link';
import { usePathname } from 'next/navigation';
import { useActionState } from 'react';

import { untouchedForm, type FormState } from '@/lib/access/form-state';

interface WorkspaceHeaderProps {
  name: string;
  sections: { href: string; label: string }[];
  signOut: (state: FormState, form: FormData) => Promise<FormState>;
}

export function WorkspaceHeader({ name, sections, signOut }: WorkspaceHeaderProps) {
  const path = usePathname();
  const [, leave] = useActionState(signOut, untouchedForm);
  return (
    <header className="flex min-h-14 flex-wrap items-center gap-x-6 gap-y-1 border-b border-thread bg-paper px-4 sm:px-7">
      <Link href="/portfolios" className="font-serif text-[21px] font-semibold">
        Heddle
      </Link>
      <nav aria-label="Main" className="flex-1">
        <ul className="flex gap-4">
          {sections.map(({ href, label }) => (
            <li key={href}>
              <Link href={href} aria-current={path.startsWith(href) ? 'true' : undefined} className="py-2 aria-[current]:font-semibold">
                {label}
              </Link>
            </li>
          ))}
        </ul>
      </nav>
      <Link href="/account" className="text-indigo underline underline-offset-2">
        {name}
      </Link>
      <form action={leave}>
        <button type="submit" className="text-indigo underline underline-offset-2">
          Sign out
        </button>
      </form>
    </header>
  );
}
