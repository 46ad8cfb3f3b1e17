'use client';

import { useFormStatus } from 'react-dom';
import { Button, type ButtonProps } from './button';

export type SubmitButtonProps = Omit<ButtonProps, 'type'>;

export function SubmitButton({ variant = 'primary', pending, ...rest }: SubmitButtonProps) {
  const status = useFormStatus();
  return <Button {...rest} type="submit" variant={variant} pending={pending ?? status.pending} />;
}
