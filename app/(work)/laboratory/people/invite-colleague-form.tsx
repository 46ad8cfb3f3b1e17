'use client';

import { useActionState } from 'react';
import { Select, TextInput } from '@/components/ui/controls';
import { FormMessage } from '@/components/ui/form-message';
import { SubmitButton } from '@/components/ui/submit-button';
import { LABORATORY_ROLES, ROLE_NAMES } from '@/lib/rules/roles';
import { inviteColleagueAction } from './actions';

const ROLES = LABORATORY_ROLES.toReversed().map((role) => ({ value: role, label: ROLE_NAMES[role] }));

export function InviteColleagueForm() {
  const [state, action] = useActionState(inviteColleagueAction, null);
  const failed = state?.ok === false ? state : null;
  const role = failed?.values?.role ?? 'analyst';
  return (
    <form action={action} noValidate className="flex max-w-md flex-col gap-4">
      <FormMessage kind={state?.ok ? 'done' : 'problem'}>
        {state?.ok
          ? `${state.data.name} is invited. A link that is good for seven days is on its way.`
          : failed?.formError}
      </FormMessage>
      <TextInput
        name="name"
        label="Name"
        required
        defaultValue={failed?.values?.name}
        error={failed?.fieldErrors?.name}
      />
      <TextInput
        name="email"
        type="email"
        label="E-mail"
        required
        defaultValue={failed?.values?.email}
        error={failed?.fieldErrors?.email}
      />
      <Select
        key={role}
        name="role"
        label="Role"
        options={ROLES}
        defaultValue={role}
        error={failed?.fieldErrors?.role}
      />
      <div>
        <SubmitButton pendingLabel="Inviting">Invite</SubmitButton>
      </div>
    </form>
  );
}
