import { type ReactNode } from 'react';

import { signOut } from '@/app/(auth)/actions';
import { Header } from '@/components/frame/header';
import { MainRow } from '@/components/frame/section-row';
import { actorForPage } from '@/lib/access/actor';
import { roleMay } from '@/lib/access/permissions';

/** Everything behind sign-in. Pages ask for their actor themselves too: this layout is not drawn anew when people go from page to page. */
export default async function WorkspaceLayout({ children }: { children: ReactNode }) {
  const actor = await actorForPage();
  const sections = [{ href: '/portfolios', label: 'Portfolios' }, ...(roleMay(actor.role, 'user.manage') ? [{ href: '/admin', label: 'Administration' }] : [])];
  return (
    <>
      <Header person={{ name: actor.name, email: actor.email }} signOut={signOut} />
      <MainRow items={sections} />
      <main id="main">{children}</main>
    </>
  );
}
