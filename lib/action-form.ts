import type * as z from 'zod';

/** What an action hands back to its form; `values` are the fields as typed, without passwords. */
export type ActionResult<T = void> =
  | { ok: true; data: T }
  | {
      ok: false;
      formError?: string;
      fieldErrors?: Record<string, string>;
      values?: Record<string, string>;
    };

/** State for useActionState: null before the first try. */
export type FormState<T = void> = ActionResult<T> | null;

const SECRET_FIELD = /password|token|secret/i;
const LIST_SUFFIX = '[]';

/** Fields by name. A name that ends in [] is a list, even with one entry or none ticked; others keep the last entry. */
export function fieldsOf(form: FormData): Record<string, FormDataEntryValue | FormDataEntryValue[]> {
  const fields: Record<string, FormDataEntryValue | FormDataEntryValue[]> = {};
  for (const name of new Set(form.keys())) {
    if (name.startsWith('$ACTION')) continue;
    const entries = form.getAll(name);
    if (name.endsWith(LIST_SUFFIX)) fields[name.slice(0, -LIST_SUFFIX.length)] = entries;
    else fields[name] = entries.at(-1) ?? '';
  }
  return fields;
}

/** What goes back into the form after an error; the entries of a list are joined with commas. */
export function valuesToKeep(form: FormData): Record<string, string> {
  const values: Record<string, string> = {};
  for (const [name, entry] of Object.entries(fieldsOf(form))) {
    if (SECRET_FIELD.test(name)) continue;
    if (typeof entry === 'string') values[name] = entry;
    else if (Array.isArray(entry)) values[name] = entry.filter((item) => typeof item === 'string').join(',');
  }
  return values;
}

/** The first message of each field; messages about the whole go to the form. */
export function errorsByField(error: z.ZodError): { formError: string; fieldErrors: Record<string, string> } {
  const fieldErrors: Record<string, string> = {};
  const whole: string[] = [];
  for (const issue of error.issues) {
    const path = issue.path.join('.');
    if (path === '') whole.push(issue.message);
    else fieldErrors[path] ??= issue.message;
  }
  return { formError: whole[0] ?? 'Nothing was saved. Look at the marked fields.', fieldErrors };
}
