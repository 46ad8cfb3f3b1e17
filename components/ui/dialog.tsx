'use client';

import X from 'lucide-react/icons/x';
import * as Radix from 'radix-ui/dialog';
import type { ReactNode } from 'react';
import { buttonStyle, type ButtonSize, type ButtonVariant } from './button-style';
import { cx } from './cx';

export type DialogProps = {
  title: ReactNode;
  description?: ReactNode;
  children?: ReactNode;
  wide?: boolean;
  triggerLabel?: ReactNode;
  triggerVariant?: ButtonVariant;
  triggerSize?: ButtonSize;
  open?: boolean;
  onOpenChange?: (open: boolean) => void;
};

/** Opens by its own trigger button, or by `open` and `onOpenChange` when there is no trigger label. */
export function Dialog({
  title,
  description,
  children,
  wide,
  triggerLabel,
  triggerVariant,
  triggerSize,
  open,
  onOpenChange,
}: DialogProps) {
  // Radix warns about a dialog without a description unless told that there is none.
  const described = description ? {} : { 'aria-describedby': undefined };
  return (
    <Radix.Root open={open} onOpenChange={onOpenChange}>
      {triggerLabel && (
        <Radix.Trigger className={buttonStyle(triggerVariant, triggerSize)}>{triggerLabel}</Radix.Trigger>
      )}
      <Radix.Portal>
        <Radix.Overlay className="fixed inset-0 z-50 bg-black/45" />
        <Radix.Content
          {...described}
          className={cx(
            'fixed inset-x-3 top-1/2 z-50 mx-auto flex max-h-[88svh] -translate-y-1/2 flex-col',
            'rounded-xs border border-rule-strong bg-paper text-ink',
            wide ? 'max-w-4xl' : 'max-w-lg',
          )}
        >
          <div className="flex items-start gap-4 border-b px-5 py-3">
            <div className="min-w-0 flex-1">
              <Radix.Title className="font-serif text-xl">{title}</Radix.Title>
              {description && (
                <Radix.Description className="mt-1 text-ink-soft">{description}</Radix.Description>
              )}
            </div>
            <Radix.Close className={cx(buttonStyle('quiet', 'small'), '-mr-2')} aria-label="Close">
              <X aria-hidden="true" size={18} />
            </Radix.Close>
          </div>
          {children && <div className="overflow-auto px-5 py-4">{children}</div>}
        </Radix.Content>
      </Radix.Portal>
    </Radix.Root>
  );
}
