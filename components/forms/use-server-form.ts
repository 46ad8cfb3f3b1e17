'use client';

import { startTransition, useActionState, useEffect, useEffectEvent, type FormEvent } from 'react';
import type { ActionResult, FormState } from '@/lib/action-form';

/** A server action made by formAction; it takes no notice of the state before. */
export type FormAction = (previous: null, form: FormData) => Promise<ActionResult<unknown>>;

type StatefulAction = (previous: FormState<unknown>, form: FormData) => Promise<FormState<unknown>>;
type Values = Record<string, string | number | boolean | null | undefined>;

/**
 * A form that a server action answers. It works without script through `action`; with script the submission is sent
 * by hand, because React empties a form after its action, also when the action refused what was typed.
 */
export function useServerForm(action: FormAction, onDone?: () => void) {
  const [state, dispatch, pending] = useActionState(action as StatefulAction, null);
  const refused = state && !state.ok ? state : null;
  const isDone = state?.ok === true;
  const done = useEffectEvent(() => onDone?.());
  useEffect(() => {
    if (isDone) done();
  }, [isDone]);

  function send(form: HTMLFormElement, submitter?: HTMLElement | null) {
    const data = new FormData(form, submitter);
    startTransition(() => dispatch(data));
  }

  function onSubmit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    if (!pending) send(event.currentTarget, (event.nativeEvent as SubmitEvent).submitter);
  }

  return {
    pending,
    send,
    formProps: { action: dispatch, onSubmit, noValidate: true },
    formError: refused?.formError,
    errorOf: (name: string): string | undefined => refused?.fieldErrors?.[name],
    /** What was typed before a refusal without script, else what the page brings. */
    valueOf: (name: string, values: Values = {}): string => {
      const value = refused?.values?.[name] ?? values[name];
      return value === null || value === undefined ? '' : String(value);
    },
    isDone,
  };
}
