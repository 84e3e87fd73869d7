'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { TextInput } from '@/components/ui/text-input';
import { auth } from '@/lib/client/auth';

const schema = z.object({
  name: z.string().trim().min(1, 'Write your name.').max(120),
  email: z.email('Write your mail address.'),
  password: z.string().min(10, 'At least 10 characters.').max(128),
});

/** Makes an account; it can be used once the address is confirmed. */
export function SignUpForm() {
  const [sentTo, setSentTo] = useState<string | null>(null);
  const form = useForm({
    resolver: zodResolver(schema),
    defaultValues: { name: '', email: '', password: '' },
  });
  const { errors, isSubmitting } = form.formState;

  const submit = form.handleSubmit(async (values) => {
    const { error } = await auth.signUp.email({ ...values, callbackURL: '/' });
    if (error)
      form.setError('root', {
        message: error.message ?? 'The server could not be reached. Nothing was saved.',
      });
    else setSentTo(values.email);
  });

  if (sentTo) {
    return (
      <Notice tone="moss" title="Look into your mail">
        A link to confirm {sentTo} is on its way. If you already have an account there, sign in instead.
      </Notice>
    );
  }
  return (
    <form onSubmit={submit} noValidate className="flex flex-col gap-4">
      {errors.root ? <Notice tone="alarm">{errors.root.message}</Notice> : null}
      <Field label="Your name" error={errors.name?.message} required>
        <TextInput autoComplete="name" {...form.register('name')} />
      </Field>
      <Field label="Mail address" error={errors.email?.message} required>
        <TextInput type="email" autoComplete="username" {...form.register('email')} />
      </Field>
      <Field label="Password" hint="At least 10 characters" error={errors.password?.message} required>
        <TextInput type="password" autoComplete="new-password" {...form.register('password')} />
      </Field>
      <Button type="submit" tone="primary" size="lg" busy={isSubmitting}>
        Make an account
      </Button>
    </form>
  );
}
