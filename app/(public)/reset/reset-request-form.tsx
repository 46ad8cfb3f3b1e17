'use client';

import { useActionState } from 'react';
import { TextInput } from '@/components/ui/controls';
import { FormMessage } from '@/components/ui/form-message';
import { SubmitButton } from '@/components/ui/submit-button';
import { askForResetAction } from '../link-actions';

export function ResetRequestForm() {
  const [state, action] = useActionState(askForResetAction, null);
  const failed = state?.ok === false ? state : null;
  return (
    <form action={action} noValidate className="flex max-w-sm flex-col gap-4">
      <FormMessage kind={state?.ok ? 'done' : 'problem'}>
        {state?.ok
          ? `If ${state.data.email} has an account, a link is on its way. Look into the junk folder as well.`
          : failed?.formError}
      </FormMessage>
      <TextInput
        name="email"
        type="email"
        label="E-mail"
        autoComplete="username"
        required
        defaultValue={state?.ok ? state.data.email : failed?.values?.email}
        error={failed?.fieldErrors?.email}
      />
      <div>
        <SubmitButton pendingLabel="Sending">Send a link</SubmitButton>
      </div>
    </form>
  );
}
