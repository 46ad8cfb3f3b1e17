'use client';

import { TextArea, TextInput } from '@/components/ui/controls';
import { FormMessage } from '@/components/ui/form-message';
import { SubmitButton } from '@/components/ui/submit-button';
import { useServerForm, type FormAction } from './use-server-form';

export type SchemeFormProps = {
  action: FormAction;
  scheme?: { slug: string; name: string; description: string };
  onDone?: () => void;
};

export function SchemeForm({ action, scheme, onDone }: SchemeFormProps) {
  const form = useServerForm(action, onDone);
  return (
    <form {...form.formProps} className="flex max-w-measure flex-col gap-4">
      {scheme && <input type="hidden" name="scheme" value={scheme.slug} />}
      <TextInput
        label="Name"
        name="name"
        hint="As it stands on reports, such as Mycotoxins in maize"
        error={form.errorOf('name')}
        defaultValue={form.valueOf('name', scheme)}
      />
      <TextArea
        label="Description"
        name="description"
        optional
        hint="What the scheme covers and for whom"
        error={form.errorOf('description')}
        defaultValue={form.valueOf('description', scheme)}
      />
      <FormMessage>{form.formError}</FormMessage>
      <div>
        <SubmitButton pending={form.pending} pendingLabel="Saving">
          {scheme ? 'Save' : 'Create scheme'}
        </SubmitButton>
      </div>
    </form>
  );
}
