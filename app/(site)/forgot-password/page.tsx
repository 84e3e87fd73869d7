import type { Metadata } from 'next';
import { ForgotPasswordForm } from '@/components/site/password-forms';

export const metadata: Metadata = { title: 'Forgot the password' };

export default function ForgotPasswordPage() {
  return (
    <div className="mx-auto w-full max-w-sm pt-6">
      <h1 className="mb-5 text-2xl">Forgot the password</h1>
      <ForgotPasswordForm />
    </div>
  );
}
