'use client';

import { useState, type ReactNode } from 'react';
import { Dialog } from '@/components/ui/dialog';
import type { ButtonSize, ButtonVariant } from '@/components/ui/button-style';

export type FormDialogProps = {
  label: string;
  title: string;
  variant?: ButtonVariant;
  size?: ButtonSize;
  wide?: boolean;
  children: (close: () => void) => ReactNode;
};

/** A form in a dialog of its own; it closes when the form is done. */
export function FormDialog({ label, title, variant, size, wide, children }: FormDialogProps) {
  const [open, setOpen] = useState(false);
  return (
    <Dialog
      triggerLabel={label}
      triggerVariant={variant}
      triggerSize={size}
      title={title}
      wide={wide}
      open={open}
      onOpenChange={setOpen}
    >
      {children(() => setOpen(false))}
    </Dialog>
  );
}
