import type { Metadata } from 'next';
import { SignUpForm } from '@/components/site/sign-up-form';

export const metadata: Metadata = { title: 'Make an account' };

export default function SignUpPage() {
  return (
    <div className="mx-auto w-full max-w-sm pt-6">
      <h1 className="mb-5 text-2xl">Make an account</h1>
      <SignUpForm />
    </div>
  );
}
