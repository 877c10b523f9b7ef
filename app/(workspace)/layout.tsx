import { type ReactNode } from 'react';

import { signOut } from '@/app/(auth)/actions';
import { WorkspaceHeader } from '@/components/access/workspace-header';
import { actorForPage } from '@/lib/access/actor';
import { roleMay } from '@/lib/access/permissions';

/** Everything behind sign-in. Pages ask for their actor themselves too: this layout is not drawn anew when people go from page to page. */
export default async function WorkspaceLayout({ children }: { children: ReactNode }) {
  const actor = await actorForPage();
  const sections = [{ href: '/portfolios', label: 'Portfolios' }, ...(roleMay(actor.role, 'user.manage') ? [{ href: '/admin', label: 'Administration' }] : [])];
  return (
    <>
      <WorkspaceHeader name={actor.name} sections={sections} signOut={signOut} />
      <main id="main">{children}</main>
    </>
  );
}
