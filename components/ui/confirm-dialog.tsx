'use client';

import { useState, useTransition, type ReactNode } from 'react';
import { Button } from './button';
import type { ButtonSize, ButtonVariant } from './button-style';
import { TextArea } from './controls';
import { Dialog } from './dialog';
import { FormMessage } from './form-message';

export type ConfirmOutcome = { ok: boolean; formError?: string } | void;
export type ConfirmDialogProps = {
  triggerLabel: ReactNode;
  triggerVariant?: ButtonVariant;
  triggerSize?: ButtonSize;
  title: ReactNode;
  children?: ReactNode;
  confirmLabel: ReactNode;
  pendingLabel?: string;
  cancelLabel?: ReactNode;
  danger?: boolean;
  fields?: Record<string, string>;
  reason?: { name: string; label: string; hint?: string };
  action: (form: FormData) => Promise<ConfirmOutcome> | ConfirmOutcome;
};

/** Asks before a step that cannot be taken back. What the action refuses is shown, and the dialog stays. */
export function ConfirmDialog({
  title,
  children,
  confirmLabel,
  pendingLabel,
  cancelLabel = 'Leave it as it is',
  danger,
  fields = {},
  reason,
  action,
  ...trigger
}: ConfirmDialogProps) {
  const [open, setOpen] = useState(false);
  const [refusal, setRefusal] = useState<string>();
  const [pending, startTransition] = useTransition();

  function onOpenChange(next: boolean) {
    if (pending) return;
    setOpen(next);
    setRefusal(undefined);
  }

  function onSubmit(form: FormData) {
    startTransition(async () => {
      const outcome = await action(form);
      const refused = outcome && !outcome.ok ? (outcome.formError ?? 'This was not done.') : undefined;
      setRefusal(refused);
      if (!refused) setOpen(false);
    });
  }

  return (
    <Dialog {...trigger} title={title} open={open} onOpenChange={onOpenChange}>
      <form
        // Not the action attribute: React would empty the reason when the action refuses.
        onSubmit={(event) => {
          event.preventDefault();
          onSubmit(new FormData(event.currentTarget));
        }}
        className="flex flex-col gap-4"
      >
        {Object.entries(fields).map(([name, value]) => (
          <input key={name} type="hidden" name={name} value={value} />
        ))}
        {children && <div>{children}</div>}
        {reason && <TextArea name={reason.name} label={reason.label} hint={reason.hint} required rows={3} />}
        <FormMessage>{refusal}</FormMessage>
        <div className="flex flex-wrap gap-2">
          <Button
            type="submit"
            variant={danger ? 'danger' : 'primary'}
            pending={pending}
            pendingLabel={pendingLabel}
          >
            {confirmLabel}
          </Button>
          <Button variant="quiet" onClick={() => onOpenChange(false)}>
            {cancelLabel}
          </Button>
        </div>
      </form>
    </Dialog>
  );
}
