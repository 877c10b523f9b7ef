import { type Metadata } from 'next';
import { z } from 'zod';

import { MailText } from '@/app/(workspace)/admin/mail/mail-text';
import { Moment } from '@/components/access/moment';
import { PageLinks } from '@/components/access/page-links';
import { ButtonLink } from '@/components/ui/button';
import { EmptyState, Pill } from '@/components/ui/status';
import { actorForPageOf } from '@/lib/access/actor';
import { readPageQuery, type SearchParams } from '@/lib/access/page-query';
import { paging } from '@/lib/api/schemas';
import { hasMailServer, listMails } from '@/lib/services/mail';

export const metadata: Metadata = { title: 'Mail' };

const states = { kept: { words: 'Kept here', tone: 'neutral' }, sent: { words: 'Sent', tone: 'done' }, failed: { words: 'Not sent', tone: 'problem' } } as const;

export default async function MailPage({ searchParams }: { searchParams: SearchParams }) {
  await actorForPageOf('mail.view');
  const { page } = await readPageQuery(z.object({ page: paging.page }), searchParams);
  const mails = await listMails({ page, pageSize: 20 });
  return (
    <>
      <header>
        <h1 className="text-[31px] leading-[35px]">Mail</h1>
        <p className="max-w-prose text-ink-soft">{hasMailServer() ? 'Every message of the service.' : 'No mail server is set up (SMTP_URL), so every message is kept here. Pass its link on to the person it is for, and to nobody else.'}</p>
      </header>
      {mails.total === 0 && (
        <EmptyState title="No message was written yet" action={<ButtonLink href="/admin">To the people</ButtonLink>}>
          Inviting somebody writes the first.
        </EmptyState>
      )}
      <ul className="grid max-w-3xl gap-4">
        {mails.items.map((mail) => (
          <li key={mail.id}>
            <article aria-labelledby={`mail-${mail.id}`} className="grid gap-2 border border-thread bg-paper p-4">
              <header className="grid gap-0.5">
                <h2 id={`mail-${mail.id}`} className="font-serif text-[16.5px] leading-[21px]">
                  {mail.subject}
                </h2>
                <p className="text-[13px] text-ink-soft">
                  To {mail.recipient}, <Moment at={mail.createdAt} />, <Pill tone={states[mail.state].tone}>{states[mail.state].words}</Pill>
                </p>
              </header>
              {mail.error && <p className="text-[13px] text-madder">{mail.error}</p>}
              <MailText text={mail.body} />
            </article>
          </li>
        ))}
      </ul>
      <PageLinks path="/admin/mail" page={page} pageSize={20} total={mails.total} />
    </>
  );
}
