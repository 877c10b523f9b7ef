import { type Metadata } from 'next';

import { InvitationForm } from '@/app/(auth)/invitation/[token]/invitation-form';
import { findInvitation } from '@/lib/access/invitations';

export const metadata: Metadata = { title: 'Your invitation', referrer: 'no-referrer' };

export default async function InvitationPage({ params }: { params: Promise<{ token: string }> }) {
  const { token } = await params;
  const invitation = await findInvitation(token);
  return (
    <>
      <h1 className="text-[31px] leading-[35px]">Your invitation</h1>
      {invitation ? (
        <>
          <p className="text-ink-soft">
            You come as <strong className="text-ink">{invitation.role}</strong> and sign in with <strong className="break-all text-ink">{invitation.email}</strong>.
          </p>
          <InvitationForm secret={token} name={invitation.name} email={invitation.email} />
        </>
      ) : (
        <p>This invitation was used, taken back or is too old. Ask whoever invited you for a new one.</p>
      )}
    </>
  );
}
