'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import type { FormEvent } from 'react';
import { useForm, type FieldValues } from 'react-hook-form';
import type * as z from 'zod';
import { useServerForm, type FormAction } from './use-server-form';

/** A server form that also tells early what is wrong, by the schema that the action uses. */
export function useCheckedForm(
  schema: z.ZodType<object, FieldValues>,
  action: FormAction,
  defaults: Record<string, string | boolean>,
  onDone?: () => void,
) {
  const server = useServerForm(action, onDone);
  const form = useForm<FieldValues>({
    resolver: zodResolver(schema),
    mode: 'onTouched',
    defaultValues: defaults,
  });
  const { errors } = form.formState;

  function onSubmit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    const target = event.currentTarget;
    if (server.pending) return;
    void form.handleSubmit(() => server.send(target))(event);
  }

  function errorOf(name: string): string | undefined {
    const found = errors[name]?.message;
    return typeof found === 'string' ? found : server.errorOf(name);
  }

  return {
    pending: server.pending,
    formError: server.formError,
    formProps: { ...server.formProps, onSubmit },
    watch: form.watch,
    /** Props of a text field. */
    field: (name: string) => ({
      ...form.register(name),
      defaultValue: server.valueOf(name, defaults),
      error: errorOf(name),
    }),
    tick: (name: string) => ({
      ...form.register(name),
      defaultChecked: defaults[name] === true,
      error: errorOf(name),
    }),
    errorOf,
  };
}
