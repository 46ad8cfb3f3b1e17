import type { ReactNode } from 'react';
import { cx } from './cx';

export type FieldProps = {
  label: ReactNode;
  hint?: ReactNode;
  error?: string;
  optional?: boolean;
  hideLabel?: boolean;
  className?: string;
};

export type FieldWiring = {
  id: string;
  'aria-invalid': true | undefined;
  'aria-describedby': string | undefined;
};

/** What a control needs so that its label, hint and error are read out with it. */
export function wireField(id: string, { hint, error }: Pick<FieldProps, 'hint' | 'error'>): FieldWiring {
  const described = [hint ? `${id}-hint` : '', error ? `${id}-error` : ''].filter(Boolean).join(' ');
  return { id, 'aria-invalid': error ? true : undefined, 'aria-describedby': described || undefined };
}

export function Field({
  id,
  label,
  hint,
  error,
  optional,
  hideLabel,
  className,
  children,
}: FieldProps & { id: string; children: ReactNode }) {
  return (
    <div className={cx('flex flex-col gap-1', className)}>
      <label htmlFor={id} className={hideLabel ? 'sr-only' : 'font-semibold'}>
        {label}
        {optional && <span className="font-normal text-ink-faint"> (optional)</span>}
      </label>
      {hint && (
        <p id={`${id}-hint`} className="text-sm text-ink-soft">
          {hint}
        </p>
      )}
      {children}
      <FieldError id={id} error={error} />
    </div>
  );
}

export function FieldError({ id, error }: { id: string; error?: string }) {
  return (
    <div aria-live="polite">
      {error && (
        <p id={`${id}-error`} className="flex items-baseline gap-1.5 text-sm font-semibold text-action">
          <span aria-hidden="true" className="size-2 shrink-0 bg-action" />
          <span>{error}</span>
        </p>
      )}
    </div>
  );
}

export const CONTROL_STYLE =
  'w-full min-h-11 rounded-xs border border-rule-strong bg-paper-raised px-3 py-1.5 text-ink ' +
  'placeholder:text-ink-faint aria-invalid:border-action aria-invalid:border-l-4 ' +
  'disabled:bg-paper-wash disabled:text-ink-faint [&[readonly]]:bg-paper-wash md:min-h-9';
