'use client';

import Link from 'next/link';
import { useActionState } from 'react';
import { TextInput } from '@/components/ui/controls';
import { FormMessage } from '@/components/ui/form-message';
import { SubmitButton } from '@/components/ui/submit-button';
import { signInAction } from './actions';

export function SignInForm({ from }: { from: string }) {
  const [state, action] = useActionState(signInAction, null);
  const failed = state?.ok === false ? state : null;
  return (
    <form action={action} noValidate className="flex max-w-sm flex-col gap-4">
      <FormMessage>{failed?.formError}</FormMessage>
      <input type="hidden" name="from" value={from} />
      <TextInput
        name="email"
        type="email"
        label="E-mail"
        autoComplete="username"
        required
        defaultValue={failed?.values?.email}
        error={failed?.fieldErrors?.email}
      />
      <TextInput
        name="password"
        type="password"
        label="Password"
        autoComplete="current-password"
        required
        error={failed?.fieldErrors?.password}
      />
      <div className="flex flex-wrap items-center justify-between gap-3">
        <SubmitButton pendingLabel="Signing in">Sign in</SubmitButton>
        <Link href="/reset" className="text-link inline-flex min-h-6 items-center">
          Forgotten the password?
        </Link>
      </div>
    </form>
  );
}
