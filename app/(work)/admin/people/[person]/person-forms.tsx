'use client';

import { useActionState } from 'react';
import { TextInput } from '@/components/ui/controls';
import { FormMessage } from '@/components/ui/form-message';
import { SubmitButton } from '@/components/ui/submit-button';
import { changePersonAction, giveLaboratoryRoleAction } from '../actions';
import { LaboratoryRoleFields } from '../laboratory-role-fields';
import { ProviderRoles } from '../provider-roles';

export function ChangePersonForm({ person }: { person: { id: number; name: string; roles: string[] } }) {
  const [state, action] = useActionState(changePersonAction, null);
  const failed = state?.ok === false ? state : null;
  return (
    <form action={action} noValidate className="flex flex-col gap-4">
      <FormMessage kind={state?.ok ? 'done' : 'problem'}>
        {state?.ok ? 'Saved. It counts from the next click of the person on.' : failed?.formError}
      </FormMessage>
      <input type="hidden" name="userId" value={person.id} />
      <TextInput
        name="name"
        label="Name"
        required
        defaultValue={failed?.values?.name ?? person.name}
        error={failed?.fieldErrors?.name}
      />
      <ProviderRoles
        checked={failed ? (failed.values?.providerRoles ?? '').split(',') : person.roles}
        error={failed?.fieldErrors?.providerRoles}
      />
      <div>
        <SubmitButton pendingLabel="Saving">Save</SubmitButton>
      </div>
    </form>
  );
}

interface GiveLaboratoryRoleFormProps {
  userId: number;
  laboratories: { id: number; name: string }[];
}

export function GiveLaboratoryRoleForm({ userId, laboratories }: GiveLaboratoryRoleFormProps) {
  const [state, action] = useActionState(giveLaboratoryRoleAction, null);
  const failed = state?.ok === false ? state : null;
  return (
    <form action={action} noValidate className="flex flex-col gap-4">
      <FormMessage kind={state?.ok ? 'done' : 'problem'}>
        {state?.ok
          ? 'The role is given, and a message says so.'
          : (failed?.fieldErrors?.email ?? failed?.formError)}
      </FormMessage>
      <input type="hidden" name="userId" value={userId} />
      <LaboratoryRoleFields
        laboratories={laboratories}
        roleName="role"
        values={failed?.values}
        errors={failed?.fieldErrors}
      />
      <div>
        <SubmitButton variant="plain" pendingLabel="Giving">
          Give this role
        </SubmitButton>
      </div>
    </form>
  );
}
