'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import Link from 'next/link';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { TextInput } from '@/components/ui/text-input';
import { auth, safeNext } from '@/lib/client/auth';

const schema = z.object({
  email: z.email('Write your mail address.'),
  password: z.string().min(1, 'Write your password.'),
});
const codeSchema = z.object({ code: z.string().regex(/^\d{6}$/, 'Six digits from your authenticator.') });

/** Signs a person in with address and password, and a code if they set one up; or mails a link. */
export function SignInForm({
  next,
  accounts,
}: {
  next?: string;
  accounts: { email: string; password: string; name: string; role: string; what: string }[];
}) {
  const [message, setMessage] = useState<{ tone: 'alarm' | 'moss'; text: string } | null>(null);
  const [asksForCode, setAsksForCode] = useState(false);
  const form = useForm({ resolver: zodResolver(schema), defaultValues: { email: '', password: '' } });
  const code = useForm({ resolver: zodResolver(codeSchema), defaultValues: { code: '' } });
  const { errors, isSubmitting } = form.formState;

  const enter = () => window.location.assign(safeNext(next));

  const signIn = form.handleSubmit(async (values) => {
    setMessage(null);
    const { data, error } = await auth.signIn.email(values);
    if (error) {
      const text =
        error.code === 'EMAIL_NOT_VERIFIED'
          ? 'Confirm your address first: we have just mailed you a new link.'
          : error.status === 429
            ? 'Too many attempts. Wait a minute and try again.'
            : error.status
              ? 'Address or password is not right.'
              : 'The server could not be reached. Try again when you are connected.';
      setMessage({ tone: 'alarm', text });
      return;
    }
    if (data && 'twoFactorRedirect' in data) setAsksForCode(true);
    else enter();
  });

  const mailLink = async () => {
    setMessage(null);
    if (!(await form.trigger('email'))) return;
    const { error } = await auth.signIn.magicLink({
      email: form.getValues('email'),
      callbackURL: safeNext(next),
    });
    setMessage(
      error
        ? { tone: 'alarm', text: 'The link could not be sent. Try again in a minute.' }
        : { tone: 'moss', text: 'A link to sign in is on its way. It works for 15 minutes.' },
    );
  };

  const verify = code.handleSubmit(async (values) => {
    const { error } = await auth.twoFactor.verifyTotp(values);
    if (error) code.setError('code', { message: 'This code is not right, or it is over.' });
    else enter();
  });

  if (asksForCode) {
    return (
      <form onSubmit={verify} noValidate className="flex flex-col gap-4">
        <Field label="Code from your authenticator" error={code.formState.errors.code?.message} required>
          <TextInput inputMode="numeric" autoComplete="one-time-code" mono {...code.register('code')} />
        </Field>
        <Button type="submit" tone="primary" busy={code.formState.isSubmitting}>
          Sign in
        </Button>
      </form>
    );
  }
  return (
    <div className="flex flex-col gap-6">
      <form onSubmit={signIn} noValidate className="flex flex-col gap-4">
        {message ? (
          <div role="status">
            <Notice tone={message.tone}>{message.text}</Notice>
          </div>
        ) : null}
        <Field label="Mail address" error={errors.email?.message} required>
          <TextInput type="email" autoComplete="username" {...form.register('email')} />
        </Field>
        <Field label="Password" error={errors.password?.message} required>
          <TextInput type="password" autoComplete="current-password" {...form.register('password')} />
        </Field>
        <Button type="submit" tone="primary" size="lg" busy={isSubmitting}>
          Sign in
        </Button>
        <div className="flex flex-wrap justify-between gap-3">
          <Button type="button" tone="link" onClick={mailLink}>
            Mail me a link instead
          </Button>
          <Link href="/forgot-password" className="text-slate underline underline-offset-3">
            Forgot the password
          </Link>
        </div>
      </form>
      {accounts.length > 0 ? (
        <section aria-labelledby="demo-accounts">
          <h2 id="demo-accounts" className="text-lg">
            Demo accounts
          </h2>
          <ul className="mt-2 flex flex-col divide-y divide-rule border-y border-rule">
            {accounts.map((account) => (
              <li key={account.email}>
                <button
                  type="button"
                  className="w-full py-2 text-left hover:bg-hover pointer-coarse:min-h-11"
                  onClick={() => {
                    form.setValue('email', account.email);
                    form.setValue('password', account.password);
                  }}
                >
                  <span className="font-semibold">{account.name}</span>{' '}
                  <span className="text-ink-2">· {account.role}</span>
                  <span className="block text-sm text-ink-2">{account.what}</span>
                </button>
              </li>
            ))}
          </ul>
        </section>
      ) : null}
    </div>
  );
}
