'use client';

import { ConfirmDialog } from '@/components/ui/confirm-dialog';
import { revokeTokenAction } from './actions';

export function RevokeToken({ id, name }: { id: number; name: string }) {
  return (
    <ConfirmDialog
      triggerLabel="Revoke"
      triggerVariant="quiet"
      triggerSize="small"
      title={`Revoke ${name}`}
      confirmLabel="Revoke for good"
      pendingLabel="Revoking"
      danger
      fields={{ id: String(id) }}
      action={(form) => revokeTokenAction(null, form)}
    >
      Programs that use it are refused from now on. It cannot be brought back; a new token can be made.
    </ConfirmDialog>
  );
}
