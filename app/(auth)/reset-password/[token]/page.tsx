import { type Metadata } from 'next';
import Link from 'next/link';

import { ResetPasswordForm } from '@/app/(auth)/reset-password/[token]/reset-password-form';
import { findPasswordReset } from '@/lib/access/accounts';

export const metadata: Metadata = { title: 'Set a new password', referrer: 'no-referrer' };

export default async function ResetPasswordPage({ params }: { params: Promise<{ token: string }> }) {
  const { token } = await params;
  const reset = await findPasswordReset(token);
  return (
    <>
      <h1 className="text-[31px] leading-[35px]">Set a new password</h1>
      {reset ? (
        <>
          <p className="text-ink-soft">
            For <strong className="text-ink">{reset.email}</strong>. You are signed out everywhere else when it is set.
          </p>
          <ResetPasswordForm secret={token} email={reset.email} />
        </>
      ) : (
        <p>
          This link was used already or is too old; the password was not changed.{' '}
          <Link href="/forgot-password" className="text-indigo underline underline-offset-2">
            Ask for a new link
          </Link>
        </p>
      )}
    </>
  );
}
