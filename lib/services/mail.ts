import nodemailer, { type Transporter } from 'nodemailer';

import { environment } from '@/lib/environment';
import { log } from '@/lib/log';
import { OutgoingMail } from '@/models/outgoing-mail';

export interface Mail {
  to: string;
  subject: string;
  /** Plain text; addresses in it stand on lines of their own. */
  text: string;
}

export interface MailView {
  id: string;
  recipient: string;
  subject: string;
  body: string;
  state: 'kept' | 'sent' | 'failed';
  error: string | null;
  createdAt: string;
  sentAt: string | null;
}

let transport: Transporter | undefined;

/** The mail server's connection, or null when none is set. */
function mailServer(): Transporter | null {
  const { SMTP_URL } = environment();
  if (!SMTP_URL) return null;
  transport ??= nodemailer.createTransport(SMTP_URL, { from: environment().MAIL_FROM });
  return transport;
}

/** Whether messages leave the service by themselves. */
export function hasMailServer(): boolean {
  return environment().SMTP_URL !== undefined;
}

async function deliver(server: Transporter, mailId: number, mail: Mail): Promise<void> {
  try {
    await server.sendMail({ to: { name: '', address: mail.to }, subject: mail.subject, text: mail.text });
    await OutgoingMail.update({ state: 'sent', sentAt: new Date() }, { where: { id: mailId } });
  } catch (error) {
    log().error({ mailId, error: error instanceof Error ? error.message : error }, 'mail was not sent');
    await OutgoingMail.update({ state: 'failed', error: error instanceof Error ? error.message : String(error) }, { where: { id: mailId } });
  }
}

/**
 * Writes the message down and hands it to the mail server where one is set; without one it is kept for administrators to pass on.
 * Returns before it is delivered: a slow mail server must not hold the request up, nor tell by its time that an account exists.
 */
export async function sendMail(mail: Mail): Promise<void> {
  // A line break in a subject would begin another header.
  const clean = { ...mail, subject: mail.subject.replace(/[\r\n]+/g, ' ').slice(0, 300) };
  const kept = await OutgoingMail.create({ recipient: clean.to, subject: clean.subject, body: clean.text, state: 'kept' });
  const server = mailServer();
  if (server) {
    deliver(server, kept.id, clean).catch((error: unknown) => log().error({ mailId: kept.id, error: error instanceof Error ? error.message : error }, 'the outcome of a mail could not be written down'));
  }
}

/** All messages, newest first. */
export async function listMails({ page, pageSize }: { page: number; pageSize: number }) {
  const { rows, count } = await OutgoingMail.findAndCountAll({ order: [['createdAt', 'DESC'], ['id', 'DESC']], limit: pageSize, offset: (page - 1) * pageSize });
  const items: MailView[] = rows.map((row) => ({
    id: String(row.id),
    recipient: row.recipient,
    subject: row.subject,
    body: row.body,
    state: row.state,
    error: row.error,
    createdAt: row.createdAt.toISOString(),
    sentAt: row.sentAt?.toISOString() ?? null,
  }));
  return { items, total: count, page, pageSize };
}
