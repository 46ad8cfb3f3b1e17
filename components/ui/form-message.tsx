import type { ReactNode } from 'react';
import { Notice } from './notice';

export type FormMessageProps = { kind?: 'problem' | 'done'; children?: ReactNode };

/** The outcome of a form as a whole. It is always in the page, so that a change is read out. */
export function FormMessage({ kind = 'problem', children }: FormMessageProps) {
  return <div aria-live="polite">{children && <Notice kind={kind}>{children}</Notice>}</div>;
}
