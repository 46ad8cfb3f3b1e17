import 'server-only';
import { unstable_rethrow } from 'next/navigation';
import type * as z from 'zod';
import { authorise } from './auth/authorise';
import { requireSession } from './auth/guards';
import { isAppError } from './errors';
import { errorsByField, fieldsOf, valuesToKeep, type ActionResult } from './action-form';
import { log, logFault } from './log';
import type { Permission, Subject } from './rules/permissions';
import type { Actor } from './rules/roles';

export type { ActionResult, FormState } from './action-form';

export interface ActionContext {
  actor: Actor;
  sessionId: string;
}

interface ActionSpec<S extends z.ZodType, T> {
  /** What the rules are asked; 'signed-in' for what everyone may do with their own account. */
  permission: Permission | 'signed-in';
  /** Whose rows are touched. Without it, permissions on `own:` things are asked for the laboratory chosen in the header. */
  subject?: (input: z.output<S>, actor: Actor) => Subject | Promise<Subject>;
  schema: S;
  run: (input: z.output<S>, context: ActionContext) => Promise<T>;
}

interface OpenActionSpec<S extends z.ZodType, T> {
  schema: S;
  run: (input: z.output<S>) => Promise<T>;
}

type FormAction<T> = (previous: ActionResult<T> | null, form: FormData) => Promise<ActionResult<T>>;

/** A server action for a form with useActionState: session, permission, schema, then `run`. */
export function formAction<S extends z.ZodType, T>(spec: ActionSpec<S, T>): FormAction<T> {
  return async (_previous, form) => {
    const session = await requireSession();
    return settle(() => runGuarded(spec, session, fieldsOf(form)), valuesToKeep(form));
  };
}

/** The same for forms that are open to everyone, such as sign-in. */
export function openFormAction<S extends z.ZodType, T>(spec: OpenActionSpec<S, T>): FormAction<T> {
  return async (_previous, form) =>
    settle(async () => check(spec.schema, fieldsOf(form), spec.run), valuesToKeep(form));
}

/** The same for actions that a component calls with an object instead of a form. */
export function dataAction<S extends z.ZodType, T>(
  spec: ActionSpec<S, T>,
): (input: z.input<S>) => Promise<ActionResult<T>> {
  return async (input) => {
    const session = await requireSession();
    return settle(() => runGuarded(spec, session, input));
  };
}

async function runGuarded<S extends z.ZodType, T>(
  spec: ActionSpec<S, T>,
  context: ActionContext,
  fields: unknown,
): Promise<ActionResult<T>> {
  const { permission, subject, schema, run } = spec;
  if (permission !== 'signed-in' && !subject) {
    await authorise(context.actor, permission, { laboratoryId: context.actor.laboratoryId });
  }
  return check(schema, fields, async (input) => {
    if (permission !== 'signed-in' && subject) {
      await authorise(context.actor, permission, await subject(input, context.actor));
    }
    return run(input, context);
  });
}

async function check<S extends z.ZodType, T>(
  schema: S,
  fields: unknown,
  run: (input: z.output<S>) => Promise<T>,
): Promise<ActionResult<T>> {
  const parsed = await schema.safeParseAsync(fields);
  if (parsed.success) return { ok: true, data: await run(parsed.data) };
  return { ok: false, ...errorsByField(parsed.error) };
}

async function settle<T>(
  work: () => Promise<ActionResult<T>>,
  values?: Record<string, string>,
): Promise<ActionResult<T>> {
  try {
    const result = await work();
    return result.ok ? result : { ...result, values };
  } catch (error) {
    unstable_rethrow(error);
    if (isAppError(error)) {
      log.info({ code: error.code, reason: error.message }, 'action refused');
      return { ok: false, formError: error.userMessage, fieldErrors: error.fieldErrors, values };
    }
    const faultId = logFault(error);
    return {
      ok: false,
      formError: `Something went wrong on our side, and nothing was changed. Tell the person who runs this installation the number ${faultId}.`,
      values,
    };
  }
}
