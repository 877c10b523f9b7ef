import { type Metadata } from 'next';
import { z } from 'zod';

import { InvitationTable } from '@/app/(workspace)/admin/invitation-table';
import { InviteForm } from '@/app/(workspace)/admin/invite-form';
import { UserTable } from '@/app/(workspace)/admin/user-table';
import { PageLinks } from '@/components/access/page-links';
import { SearchForm } from '@/components/access/search-form';
import { actorForPageOf } from '@/lib/access/actor';
import { listInvitations } from '@/lib/access/invitations';
import { readPageQuery, type SearchParams } from '@/lib/access/page-query';
import { listUsers } from '@/lib/access/users';
import { paging } from '@/lib/api/schemas';

export const metadata: Metadata = { title: 'People' };

export default async function PeoplePage({ searchParams }: { searchParams: SearchParams }) {
  const actor = await actorForPageOf('user.manage');
  const { page, q } = await readPageQuery(z.object({ page: paging.page, q: paging.q }), searchParams);
  const [users, invitations] = await Promise.all([
    listUsers({ page, pageSize: 50, q, sort: { field: 'name', descending: false } }),
    listInvitations({ page: 1, pageSize: 200, state: 'open' }),
  ]);
  return (
    <>
      <h1 className="text-[31px] leading-[35px]">People</h1>
      <section aria-label="Accounts" className="grid gap-4">
        <SearchForm label="Find by name or e-mail" q={q} />
        {users.total === 0 ? <p>Nobody is called like that. Search for part of a name or address.</p> : <UserTable users={users.items} ownId={String(actor.userId)} />}
        <PageLinks path="/admin" query={{ q }} page={page} pageSize={50} total={users.total} />
      </section>
      <section aria-labelledby="invitations" className="grid gap-4">
        <h2 id="invitations" className="text-[21px] leading-[25px]">
          Open invitations
        </h2>
        {invitations.total === 0 ? <p className="text-ink-soft">No invitation is open. Invite somebody below.</p> : <InvitationTable invitations={invitations.items} />}
      </section>
      <section aria-labelledby="invite" className="grid max-w-md gap-3">
        <h2 id="invite" className="text-[21px] leading-[25px]">
          Invite somebody
        </h2>
        <InviteForm />
      </section>
    </>
  );
}
