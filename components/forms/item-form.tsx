'use client';

import { Checkbox, TextArea, TextInput } from '@/components/ui/controls';
import { FormMessage } from '@/components/ui/form-message';
import { SubmitButton } from '@/components/ui/submit-button';
import { useServerForm, type FormAction } from './use-server-form';

export type ItemValues = { id?: number; code: string; name: string; matrix: string; handling: string };
export type ItemFormProps = {
  action: FormAction;
  round: string;
  item?: ItemValues;
  /** For a new item: the scheme's measurands to tick. */
  measurands?: { id: number; code: string; name: string }[];
  onDone?: () => void;
};

export function ItemForm({ action, round, item, measurands = [], onDone }: ItemFormProps) {
  const form = useServerForm(action, onDone);
  const text = (name: 'code' | 'name' | 'matrix' | 'handling') => ({
    name,
    error: form.errorOf(name),
    defaultValue: form.valueOf(name, item),
  });
  return (
    <form {...form.formProps} className="flex flex-col gap-4">
      <input type="hidden" name="round" value={round} />
      {item?.id !== undefined && <input type="hidden" name="item" value={item.id} />}
      <div className="grid gap-4 sm:grid-cols-2">
        <TextInput label="Code on the label" hint="Such as M1" {...text('code')} />
        <TextInput label="What it is" hint="Such as Ground maize, low level" {...text('name')} />
      </div>
      <TextInput label="Matrix" optional hint="Such as maize" {...text('matrix')} />
      <TextArea
        label="Handling and storage"
        optional
        hint="Stands on the items page beside the usual caution"
        {...text('handling')}
      />
      {measurands.length > 0 && (
        <fieldset className="flex flex-col gap-1.5">
          <legend className="mb-1 font-semibold">Measurands in this item</legend>
          {measurands.map((measurand) => (
            <Checkbox
              key={measurand.id}
              name="measurands[]"
              value={String(measurand.id)}
              defaultChecked
              label={`${measurand.code} (${measurand.name})`}
            />
          ))}
        </fieldset>
      )}
      <FormMessage>{form.formError}</FormMessage>
      <div>
        <SubmitButton pending={form.pending} pendingLabel="Saving">
          {item ? 'Save item' : 'Add item'}
        </SubmitButton>
      </div>
    </form>
  );
}
