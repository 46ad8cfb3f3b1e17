'use client';

import { useActionState } from 'react';
import { Checkbox, TextInput } from '@/components/ui/controls';
import { FormMessage } from '@/components/ui/form-message';
import { SubmitButton } from '@/components/ui/submit-button';
import { NewPasswordFields } from '../new-password-fields';
import { setUpAction } from './actions';

export function SetUpForm() {
  const [state, action] = useActionState(setUpAction, null);
  const failed = state?.ok === false ? state : null;
  return (
    <form action={action} noValidate className="flex max-w-md flex-col gap-4">
      <FormMessage>{failed?.formError}</FormMessage>
      <TextInput
        name="name"
        label="Your name"
        autoComplete="name"
        required
        defaultValue={failed?.values?.name}
        error={failed?.fieldErrors?.name}
      />
      <TextInput
        name="email"
        type="email"
        label="E-mail"
        autoComplete="username"
        required
        defaultValue={failed?.values?.email}
        error={failed?.fieldErrors?.email}
      />
      <NewPasswordFields errors={failed?.fieldErrors} />
      <Checkbox
        name="isCoordinator"
        label="I also run rounds (coordinator)"
        hint="Can be changed later under People."
        defaultChecked={failed ? failed.values?.isCoordinator === 'on' : true}
      />
      <div>
        <SubmitButton pendingLabel="Setting up">Set up and sign in</SubmitButton>
      </div>
    </form>
  );
}
