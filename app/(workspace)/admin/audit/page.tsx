import { type Metadata } from 'next';
import { z } from 'zod';

import { Moment } from '@/components/access/moment';
import { PageLinks } from '@/components/access/page-links';
import { SearchForm } from '@/components/access/search-form';
import { Cell, ColumnHead, Table, TableBody, TableHead } from '@/components/ui/table';
import { actorForPageOf } from '@/lib/access/actor';
import { listAudit } from '@/lib/access/audit';
import { readPageQuery, type SearchParams } from '@/lib/access/page-query';
import { paging } from '@/lib/api/schemas';

export const metadata: Metadata = { title: 'Audit log' };

export default async function AuditPage({ searchParams }: { searchParams: SearchParams }) {
  await actorForPageOf('audit.view');
  const { page, q } = await readPageQuery(z.object({ page: paging.page, q: paging.q }), searchParams);
  const events = await listAudit({ page, pageSize: 50, q });
  return (
    <>
      <h1 className="text-[31px] leading-[35px]">Audit log</h1>
      <SearchForm label="Show only what begins with" q={q} hint="For example session, user, invitation, import" />
      {events.total === 0 ? (
        <p>Nothing was written down that begins so.</p>
      ) : (
        <Table caption="Audit log">
          <TableHead>
            <ColumnHead>When</ColumnHead>
            <ColumnHead>Who</ColumnHead>
            <ColumnHead>What</ColumnHead>
            <ColumnHead>To what</ColumnHead>
            <ColumnHead>Details</ColumnHead>
            <ColumnHead>From</ColumnHead>
          </TableHead>
          <TableBody>
            {events.items.map((event) => (
              <tr key={event.id}>
                <Cell>
                  <Moment at={event.at} />
                </Cell>
                <Cell>{event.person?.name ?? 'nobody signed in'}</Cell>
                <Cell>
                  <code className="font-mono text-[13px]">{event.action}</code>
                </Cell>
                <Cell>{event.subjectType ? `${event.subjectType} ${event.subjectId ?? ''}` : ''}</Cell>
                <Cell className="w-2/5 [overflow-wrap:anywhere]">
                  {Object.entries(event.details ?? {}).map(([name, value]) => (
                    <span key={name} className="block text-[13px]">
                      {name}: {typeof value === 'string' ? value : JSON.stringify(value)}
                    </span>
                  ))}
                </Cell>
                <Cell className="whitespace-nowrap">{event.address ?? ''}</Cell>
              </tr>
            ))}
          </TableBody>
        </Table>
      )}
      <PageLinks path="/admin/audit" query={{ q }} page={page} pageSize={50} total={events.total} />
    </>
  );
}
