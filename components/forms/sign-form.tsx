'use client';

import { TextArea } from '@/components/ui/controls';
import { FormMessage } from '@/components/ui/form-message';
import { SubmitButton } from '@/components/ui/submit-button';
import { useServerForm, type FormAction } from './use-server-form';

export type SignFormProps = { action: FormAction; round: string; version: number };

export function SignForm({ action, round, version }: SignFormProps) {
  const form = useServerForm(action);
  return (
    <form {...form.formProps} className="flex max-w-measure flex-col gap-3">
      <input type="hidden" name="round" value={round} />
      <input type="hidden" name="version" value={version} />
      <TextArea
        label="Comment"
        name="comment"
        optional
        rows={2}
        error={form.errorOf('comment')}
        defaultValue={form.valueOf('comment')}
      />
      <FormMessage>{form.formError}</FormMessage>
      <div>
        <SubmitButton pending={form.pending} pendingLabel="Signing">
          Sign version {version}
        </SubmitButton>
      </div>
    </form>
  );
}
