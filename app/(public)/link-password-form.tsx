'use client';

import { useActionState } from 'react';
import { FormMessage } from '@/components/ui/form-message';
import { SubmitButton } from '@/components/ui/submit-button';
import type { FormState } from '@/lib/action-form';
import { NewPasswordFields } from './new-password-fields';

interface LinkPasswordFormProps {
  action: (state: FormState<never>, form: FormData) => Promise<FormState<never>>;
  link: string;
  email: string;
  label: string;
}

export function LinkPasswordForm({ action, link, email, label }: LinkPasswordFormProps) {
  const [state, submit] = useActionState(action, null);
  const failed = state?.ok === false ? state : null;
  return (
    <form action={submit} noValidate className="flex max-w-sm flex-col gap-4">
      <FormMessage>{failed?.formError}</FormMessage>
      <input type="hidden" name="link" value={link} />
      <NewPasswordFields email={email} errors={failed?.fieldErrors} />
      <div>
        <SubmitButton pendingLabel="Saving">{label}</SubmitButton>
      </div>
    </form>
  );
}
