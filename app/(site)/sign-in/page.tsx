import type { Metadata } from 'next';
import Link from 'next/link';
import { SignInForm } from '@/components/site/sign-in-form';
import { configuration } from '@/lib/services/configuration';
import { readDemoAccounts } from '@/lib/services/demo-accounts';

export const metadata: Metadata = { title: 'Sign in' };

export default async function SignInPage({ searchParams }: { searchParams: Promise<{ next?: string }> }) {
  const { next } = await searchParams;
  const { isDemo, mail } = configuration();
  return (
    <div className="mx-auto w-full max-w-sm pt-6">
      <h1 className="mb-5 text-2xl">Sign in</h1>
      <SignInForm next={next} accounts={await readDemoAccounts()} />
      <p className="mt-6 text-ink-2">
        No account yet?{' '}
        <Link href="/sign-up" className="text-slate underline">
          Make one
        </Link>
      </p>
      {isDemo && mail.inboxUrl ? (
        <p className="mt-2 text-ink-2">
          Mail of the demo arrives in the{' '}
          <a href={mail.inboxUrl} className="text-slate underline">
            local inbox
          </a>
          .
        </p>
      ) : null}
    </div>
  );
}
