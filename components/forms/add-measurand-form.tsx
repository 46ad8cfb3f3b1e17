'use client';

import { Select } from '@/components/ui/controls';
import { FormMessage } from '@/components/ui/form-message';
import { SubmitButton } from '@/components/ui/submit-button';
import { useServerForm, type FormAction } from './use-server-form';

export type AddMeasurandFormProps = {
  action: FormAction;
  round: string;
  item: { id: number; code: string };
  /** Measurands of the scheme that the item does not have yet. */
  measurands: { id: number; code: string; name: string }[];
};

export function AddMeasurandForm({ action, round, item, measurands }: AddMeasurandFormProps) {
  const form = useServerForm(action);
  return (
    <form {...form.formProps} className="flex flex-wrap items-end gap-3">
      <input type="hidden" name="round" value={round} />
      <input type="hidden" name="item" value={item.id} />
      <Select
        label={`Add a measurand to ${item.code}`}
        name="measurand"
        options={measurands.map(({ id, code, name }) => ({ value: String(id), label: `${code} (${name})` }))}
        error={form.errorOf('measurand')}
      />
      <SubmitButton variant="plain" pending={form.pending} pendingLabel="Adding">
        Add
      </SubmitButton>
      <FormMessage>{form.formError}</FormMessage>
    </form>
  );
}
