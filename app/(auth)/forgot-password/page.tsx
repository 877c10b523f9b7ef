import { type Metadata } from 'next';

import { ForgotPasswordForm } from '@/app/(auth)/forgot-password/forgot-password-form';

export const metadata: Metadata = { title: 'Forgot the password' };

export default function ForgotPasswordPage() {
  return (
    <>
      <h1 className="text-[31px] leading-[35px]">Forgot the password?</h1>
      <p className="text-ink-soft">Give the e-mail address of your account, and we send a link for a new password.</p>
      <ForgotPasswordForm />
    </>
  );
}
