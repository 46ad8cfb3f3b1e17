'use client';

import * as Radix from 'radix-ui/tooltip';
import type { ReactNode } from 'react';

export type TooltipProps = { text: ReactNode; children: ReactNode };

/** A short gloss on a word. Touch screens do not show it, so nothing may stand in it alone. */
export function Tooltip({ text, children }: TooltipProps) {
  return (
    <Radix.Provider delayDuration={250}>
      <Radix.Root>
        <Radix.Trigger
          type="button"
          className="cursor-help underline decoration-dotted decoration-1 underline-offset-3"
        >
          {children}
        </Radix.Trigger>
        <Radix.Portal>
          <Radix.Content
            sideOffset={4}
            collisionPadding={8}
            className="z-50 max-w-72 rounded-xs border border-rule-strong bg-paper-raised px-2.5 py-1.5 text-sm text-ink"
          >
            {text}
          </Radix.Content>
        </Radix.Portal>
      </Radix.Root>
    </Radix.Provider>
  );
}
