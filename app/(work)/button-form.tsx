'use client';

import { useActionState } from 'react';
import type { ButtonSize, ButtonVariant } from '@/components/ui/button-style';
import { FormMessage } from '@/components/ui/form-message';
import { SubmitButton } from '@/components/ui/submit-button';
import type { ActionResult, FormState } from '@/lib/action-form';

interface ButtonFormProps<T> {
  action: (state: FormState<T>, form: FormData) => Promise<ActionResult<T>>;
  fields: Record<string, string | number>;
  label: string;
  /** Read out after the label, as in "Remove" with "Ada Brook". */
  about?: string;
  pendingLabel?: string;
  done?: string;
  variant?: ButtonVariant;
  size?: ButtonSize;
}

/** One button that does one thing, and says so when it was refused. */
export function ButtonForm<T>(props: ButtonFormProps<T>) {
  const { action, fields, label, about, pendingLabel, done, variant = 'quiet', size = 'small' } = props;
  const [state, submit] = useActionState<FormState<T>, FormData>(action, null);
  return (
    <form action={submit} className="flex flex-col items-start [&>div:not(:empty)]:mt-1">
      {Object.entries(fields).map(([name, value]) => (
        <input key={name} type="hidden" name={name} value={value} />
      ))}
      <SubmitButton variant={variant} size={size} pendingLabel={pendingLabel}>
        {label}
        {about && <span className="sr-only"> {about}</span>}
      </SubmitButton>
      <FormMessage kind={state?.ok ? 'done' : 'problem'}>{messageOf(state, done)}</FormMessage>
    </form>
  );
}

function messageOf<T>(state: FormState<T>, done: string | undefined): string | undefined {
  if (!state) return undefined;
  if (state.ok) return done;
  return state.formError ?? Object.values(state.fieldErrors ?? {})[0];
}
