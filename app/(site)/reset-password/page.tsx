import type { Metadata } from 'next';
import { ResetPasswordForm } from '@/components/site/password-forms';
import { Notice } from '@/components/ui/notice';

export const metadata: Metadata = { title: 'Set a new password' };

export default async function ResetPasswordPage({
  searchParams,
}: {
  searchParams: Promise<{ token?: string }>;
}) {
  const { token } = await searchParams;
  return (
    <div className="mx-auto w-full max-w-sm pt-6">
      <h1 className="mb-5 text-2xl">Set a new password</h1>
      {token ? (
        <ResetPasswordForm token={token} />
      ) : (
        <Notice tone="alarm">This link is over or was used. Ask for a new one on the sign-in page.</Notice>
      )}
    </div>
  );
}
