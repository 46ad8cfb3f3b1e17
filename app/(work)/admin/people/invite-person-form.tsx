'use client';

import { useActionState } from 'react';
import { TextInput } from '@/components/ui/controls';
import { FormMessage } from '@/components/ui/form-message';
import { SubmitButton } from '@/components/ui/submit-button';
import { invitePersonAction } from './actions';
import { LaboratoryRoleFields } from './laboratory-role-fields';
import { ProviderRoles } from './provider-roles';

export function InvitePersonForm({ laboratories }: { laboratories: { id: number; name: string }[] }) {
  const [state, action] = useActionState(invitePersonAction, null);
  const failed = state?.ok === false ? state : null;
  const { values, fieldErrors: errors } = failed ?? {};
  return (
    <form action={action} noValidate className="flex flex-col gap-4">
      <FormMessage>{failed?.formError}</FormMessage>
      <div className="grid max-w-4xl gap-x-10 gap-y-4 md:grid-cols-2">
        <div className="flex flex-col gap-4">
          <TextInput name="name" label="Name" required defaultValue={values?.name} error={errors?.name} />
          <TextInput
            name="email"
            type="email"
            label="E-mail"
            hint="The invitation is sent there. Its link is good for seven days."
            required
            defaultValue={values?.email}
            error={errors?.email}
          />
        </div>
        <div className="flex flex-col gap-4">
          <ProviderRoles checked={(values?.providerRoles ?? '').split(',')} error={errors?.providerRoles} />
          <LaboratoryRoleFields
            laboratories={laboratories}
            roleName="laboratoryRole"
            values={values}
            errors={errors}
            optional
          />
        </div>
      </div>
      <div>
        <SubmitButton pendingLabel="Inviting">Invite</SubmitButton>
      </div>
    </form>
  );
}
