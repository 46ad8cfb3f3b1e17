import { cx } from './cx';

export type ButtonVariant = 'primary' | 'plain' | 'quiet' | 'danger';
export type ButtonSize = 'normal' | 'small';

const VARIANTS: Record<ButtonVariant, string> = {
  primary: 'border-press bg-press text-press-ink hover:border-press-strong hover:bg-press-strong',
  plain: 'border-press bg-transparent text-press hover:bg-paper-wash hover:text-press-strong',
  quiet: 'border-transparent bg-transparent text-press hover:bg-paper-wash hover:text-press-strong',
  danger: 'border-action bg-transparent text-action hover:bg-action hover:text-action-ink',
};

// Main actions are 44 px high on phones; the small size keeps the 24 px that a target needs at least.
const SIZES: Record<ButtonSize, string> = {
  normal: 'min-h-11 px-4 py-1.5 md:min-h-9',
  small: 'min-h-9 px-2.5 py-0.5 text-sm md:min-h-7',
};

export function buttonStyle(variant: ButtonVariant = 'plain', size: ButtonSize = 'normal'): string {
  return cx(
    'inline-flex cursor-pointer items-center justify-center gap-2 rounded-xs border font-semibold leading-tight no-underline',
    'transition-colors duration-100 aria-disabled:cursor-not-allowed aria-disabled:opacity-60',
    'disabled:cursor-not-allowed disabled:opacity-60',
    VARIANTS[variant],
    SIZES[size],
  );
}
