'use client';

import { ConfirmDialog } from '@/components/ui/confirm-dialog';
import type { ActionResult, FormState } from '@/lib/action-form';

export type DeclineDialogProps = {
  action: (previous: FormState<void>, form: FormData) => Promise<ActionResult<void>>;
  /** The round and the laboratory go with the form: another one may be chosen in another window. */
  fields: Record<string, string>;
};

export function DeclineDialog({ action, fields }: DeclineDialogProps) {
  return (
    <ConfirmDialog
      triggerLabel="Decline"
      title="Decline the invitation"
      confirmLabel="Decline the invitation"
      pendingLabel="Saving"
      cancelLabel="Go back"
      fields={fields}
      reason={{ name: 'reason', label: 'Reason', hint: 'The provider reads this.' }}
      action={async (form) => {
        const outcome = await action(null, form);
        if (outcome.ok) return { ok: true };
        return { ok: false, formError: outcome.fieldErrors?.reason ?? outcome.formError };
      }}
    >
      <p>Your laboratory will not take part. You can still accept until results are due.</p>
    </ConfirmDialog>
  );
}
