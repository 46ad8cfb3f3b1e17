'use client';

import { useActionState } from 'react';
import { TextInput } from '@/components/ui/controls';
import { FormMessage } from '@/components/ui/form-message';
import { SubmitButton } from '@/components/ui/submit-button';
import { NewPasswordFields } from '../../(public)/new-password-fields';
import { changePasswordAction } from './actions';

export function ChangePasswordForm({ email }: { email: string }) {
  const [state, action] = useActionState(changePasswordAction, null);
  const failed = state?.ok === false ? state : null;
  return (
    <form action={action} noValidate className="flex max-w-sm flex-col gap-4">
      <FormMessage kind={state?.ok ? 'done' : 'problem'}>
        {state?.ok ? 'The password is changed. You are signed out everywhere but here.' : failed?.formError}
      </FormMessage>
      <TextInput
        name="currentPassword"
        type="password"
        label="Present password"
        autoComplete="current-password"
        required
        error={failed?.fieldErrors?.currentPassword}
      />
      <NewPasswordFields email={email} errors={failed?.fieldErrors} />
      <div>
        <SubmitButton variant="plain" pendingLabel="Changing">
          Change the password
        </SubmitButton>
      </div>
    </form>
  );
}
