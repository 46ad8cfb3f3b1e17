'use client';

import { useActionState } from 'react';
import { Checkbox, Select, TextInput } from '@/components/ui/controls';
import { FormMessage } from '@/components/ui/form-message';
import { SubmitButton } from '@/components/ui/submit-button';
import { LABORATORY_KINDS } from '@/lib/schemas/laboratories';
import type { ActionResult, FormState } from '@/lib/action-form';

export interface LaboratoryValues {
  id: number;
  name: string;
  kind: string;
  town: string;
  contactEmail: string | null;
  isActive: boolean;
}

interface LaboratoryFormProps<T> {
  action: (state: FormState<T>, form: FormData) => Promise<ActionResult<T>>;
  /** Left out for a new laboratory. */
  laboratory?: LaboratoryValues;
}

const KINDS = Object.entries(LABORATORY_KINDS).map(([value, label]) => ({ value, label }));

export function LaboratoryForm<T>({ action, laboratory }: LaboratoryFormProps<T>) {
  const [state, submit] = useActionState<FormState<T>, FormData>(action, null);
  const failed = state?.ok === false ? state : null;
  const { values, fieldErrors: errors } = failed ?? {};
  const kind = values?.kind ?? laboratory?.kind ?? 'other';
  return (
    <form action={submit} noValidate className="flex max-w-md flex-col gap-4">
      <FormMessage kind={state?.ok ? 'done' : 'problem'}>
        {state?.ok ? 'Saved.' : failed?.formError}
      </FormMessage>
      {laboratory && <input type="hidden" name="id" value={laboratory.id} />}
      <TextInput
        name="name"
        label="Name"
        required
        defaultValue={values?.name ?? laboratory?.name}
        error={errors?.name}
      />
      <Select key={kind} name="kind" label="Kind" options={KINDS} defaultValue={kind} error={errors?.kind} />
      <TextInput
        name="town"
        label="Town"
        optional
        defaultValue={values?.town ?? laboratory?.town}
        error={errors?.town}
      />
      <TextInput
        name="contactEmail"
        type="email"
        label="Contact e-mail"
        optional
        defaultValue={values?.contactEmail ?? laboratory?.contactEmail ?? ''}
        error={errors?.contactEmail}
      />
      {laboratory && (
        <Checkbox
          key={String(laboratory.isActive)}
          name="isActive"
          label="Active"
          hint="Tokens of a laboratory that is not active are refused."
          defaultChecked={failed ? values?.isActive === 'on' : laboratory.isActive}
        />
      )}
      <div>
        <SubmitButton pendingLabel="Saving">{laboratory ? 'Save' : 'Add the laboratory'}</SubmitButton>
      </div>
    </form>
  );
}
