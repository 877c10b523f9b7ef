import { type ReactNode } from 'react';

import { SectionRow } from '@/components/frame/section-row';
import { actorForPageOf } from '@/lib/access/actor';

const sections = [
  { href: '/admin', label: 'People' },
  { href: '/admin/units', label: 'Units' },
  { href: '/admin/mail', label: 'Mail' },
  { href: '/admin/audit', label: 'Audit log' },
];

/** Each page below asks for its own permission as well: a layout is not drawn anew when people go from page to page. */
export default async function AdminLayout({ children }: { children: ReactNode }) {
  await actorForPageOf('user.manage');
  return (
    <>
      <SectionRow label="Administration" items={sections} />
      <div className="grid max-w-[80rem] gap-8 px-4 py-6 sm:px-7">{children}</div>
    </>
  );
}
