'use client';

import { useEffect, useState, type ReactNode } from 'react';
import { Button } from './button';
import type { ButtonSize, ButtonVariant } from './button-style';
import { copyText } from './copy-text';

export type CopyButtonProps = {
  text: string | (() => string);
  label?: ReactNode;
  doneLabel?: string;
  variant?: ButtonVariant;
  size?: ButtonSize;
};

const SHOWN_FOR_MS = 2500;

export function CopyButton({
  text,
  label = 'Copy',
  doneLabel = 'Copied',
  variant = 'quiet',
  size = 'small',
}: CopyButtonProps) {
  const [outcome, setOutcome] = useState<'done' | 'failed'>();

  useEffect(() => {
    if (!outcome) return;
    const timer = setTimeout(() => setOutcome(undefined), SHOWN_FOR_MS);
    return () => clearTimeout(timer);
  }, [outcome]);

  async function onClick() {
    setOutcome((await copyText(typeof text === 'string' ? text : text())) ? 'done' : 'failed');
  }

  return (
    <Button variant={variant} size={size} onClick={onClick} className="no-print">
      {outcome ? null : label}
      <span aria-live="polite">
        {outcome === 'done' && doneLabel}
        {outcome === 'failed' && 'Not copied; select the text by hand'}
      </span>
    </Button>
  );
}
