import Link from 'next/link';
import type { ComponentProps } from 'react';
import { buttonStyle, type ButtonSize, type ButtonVariant } from './button-style';
import { cx } from './cx';

export type ButtonProps = ComponentProps<'button'> & {
  variant?: ButtonVariant;
  size?: ButtonSize;
  pending?: boolean;
  pendingLabel?: string;
};

export function Button({
  variant = 'plain',
  size = 'normal',
  pending = false,
  pendingLabel,
  type = 'button',
  className,
  onClick,
  children,
  ...rest
}: ButtonProps) {
  return (
    <button
      {...rest}
      // A pending button keeps the focus, so it is not disabled; it just no longer does anything.
      type={pending ? 'button' : type}
      onClick={pending ? undefined : onClick}
      aria-disabled={pending || rest['aria-disabled'] || undefined}
      aria-busy={pending || undefined}
      className={cx(buttonStyle(variant, size), pending && 'cursor-progress', className)}
    >
      {pending && pendingLabel ? pendingLabel : children}
    </button>
  );
}

export type ButtonLinkProps = Omit<ComponentProps<typeof Link>, 'href'> & {
  href: string;
  variant?: ButtonVariant;
  size?: ButtonSize;
};

export function ButtonLink({ variant = 'plain', size = 'normal', className, ...rest }: ButtonLinkProps) {
  return <Link {...rest} className={cx(buttonStyle(variant, size), className)} />;
}
