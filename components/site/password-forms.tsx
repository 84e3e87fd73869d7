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
import { auth } from '@/lib/client/auth';

/** Mails a link to set a new password; says the same whether the address is known or not. */
export function ForgotPasswordForm() {
  const [isSent, setIsSent] = useState(false);
  const form = useForm({
    resolver: zodResolver(z.object({ email: z.email('Write your mail address.') })),
    defaultValues: { email: '' },
  });
  const submit = form.handleSubmit(async ({ email }) => {
    const { error } = await auth.requestPasswordReset({ email, redirectTo: '/reset-password' });
    if (error) form.setError('email', { message: 'The mail could not be asked for. Try again in a minute.' });
    else setIsSent(true);
  });
  if (isSent)
    return (
      <Notice tone="moss">If an account has this address, a link to set a new password is on its way.</Notice>
    );
  return (
    <form onSubmit={submit} noValidate className="flex flex-col gap-4">
      <Field label="Mail address" error={form.formState.errors.email?.message} required>
        <TextInput type="email" autoComplete="username" {...form.register('email')} />
      </Field>
      <Button type="submit" tone="primary" size="lg" busy={form.formState.isSubmitting}>
        Mail me a link
      </Button>
    </form>
  );
}

/** Sets a new password with the token of a mailed link; every other session ends. */
export function ResetPasswordForm({ token }: { token: string }) {
  const [isDone, setIsDone] = useState(false);
  const form = useForm({
    resolver: zodResolver(z.object({ newPassword: z.string().min(10, 'At least 10 characters.').max(128) })),
    defaultValues: { newPassword: '' },
  });
  const submit = form.handleSubmit(async ({ newPassword }) => {
    const { error } = await auth.resetPassword({ newPassword, token });
    if (error) form.setError('newPassword', { message: 'The link is over or was used. Ask for a new one.' });
    else setIsDone(true);
  });
  if (isDone) {
    return (
      <Notice tone="moss" title="The new password holds">
        <Link href="/sign-in" className="underline">
          Sign in
        </Link>
      </Notice>
    );
  }
  return (
    <form onSubmit={submit} noValidate className="flex flex-col gap-4">
      <Field
        label="New password"
        hint="At least 10 characters"
        error={form.formState.errors.newPassword?.message}
        required
      >
        <TextInput type="password" autoComplete="new-password" {...form.register('newPassword')} />
      </Field>
      <Button type="submit" tone="primary" size="lg" busy={form.formState.isSubmitting}>
        Set the password
      </Button>
    </form>
  );
}
