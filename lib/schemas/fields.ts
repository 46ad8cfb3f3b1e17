import * as z from 'zod';

export const NAME_LENGTH = 120;
export const TEXT_LENGTH = 4_000;
const CODE_LENGTH = 20;

/** Line breaks, control codes and marks that turn the direction of writing: in a name they forge what stands around it. */
const NOT_IN_A_LINE = /[\p{Cc}\p{Zl}\p{Zp}\u202a-\u202e\u2066-\u2069]/u;

/** A text of one line, such as a name: it goes into subjects, headings and letters. */
export function requiredText(what: string, max = NAME_LENGTH) {
  return requiredNote(what, max).refine(
    (text) => !NOT_IN_A_LINE.test(text),
    `Write ${what} in one line, without characters that cannot be seen.`,
  );
}

/** A text that may have several lines, such as a reason. */
export function requiredNote(what: string, max: number) {
  return z
    .string({ error: `Enter ${what}.` })
    .trim()
    .min(1, `Enter ${what}.`)
    .max(max, `Shorten ${what} to ${max} characters.`);
}

export function optionalText(max = TEXT_LENGTH) {
  return z
    .string()
    .trim()
    .max(max, `Shorten this to ${max} characters.`)
    .optional()
    .transform((text) => text ?? '');
}

/** A code printed on labels and used in files: letters, digits, dot, hyphen, underscore. */
export function codeText(what: string) {
  return requiredText(what, CODE_LENGTH).regex(
    /^[A-Za-z0-9][A-Za-z0-9._-]*$/,
    `Use letters, digits, dot, hyphen and underscore for ${what}, without spaces.`,
  );
}

const DECIMAL = /^[-+]?(\d+([.,]\d*)?|[.,]\d+)([eE][-+]?\d+)?$/;

function toNumber(text: string): number {
  return DECIMAL.test(text) ? Number(text.replace(',', '.')) : Number.NaN;
}

/** A number typed with a decimal point or comma; an empty field is null. */
export function optionalNumber(what: string, bounds: { above?: number; min?: number; max?: number } = {}) {
  return z
    .string()
    .trim()
    .optional()
    .transform((text) => (text ? toNumber(text) : null))
    .refine((value) => value === null || Number.isFinite(value), `Enter ${what} as a number such as 12.5.`)
    .refine((value) => value === null || bounds.above === undefined || !(value <= bounds.above), {
      error: `Enter ${what} above ${bounds.above}.`,
    })
    .refine((value) => value === null || bounds.min === undefined || !(value < bounds.min), {
      error: `Enter ${what} of at least ${bounds.min}.`,
    })
    .refine((value) => value === null || bounds.max === undefined || !(value > bounds.max), {
      error: `Enter ${what} of at most ${bounds.max}.`,
    });
}

export function wholeNumber(what: string, min: number, max: number) {
  return z
    .string({ error: `Enter ${what} from ${min} to ${max}.` })
    .trim()
    .regex(/^\d{1,9}$/, `Enter ${what} as a whole number from ${min} to ${max}.`)
    .transform(Number)
    .refine((value) => value >= min && value <= max, `Enter ${what} from ${min} to ${max}.`);
}

const DATE_TIME = /^(\d{4}-\d{2}-\d{2})(?:T(\d{2}:\d{2}))?(?::\d{2}(?:\.\d{1,3})?)?Z?$/;

/** A date with or without a time, read as UTC; gives ISO 8601 text. */
export function utcDateTime(what: string) {
  return z
    .string({ error: `Enter ${what}.` })
    .trim()
    .transform((text, context) => {
      const match = DATE_TIME.exec(text);
      const date = match ? new Date(`${match[1]}T${match[2] ?? '00:00'}:00.000Z`) : null;
      if (!date || Number.isNaN(date.getTime()) || date.toISOString().slice(0, 10) !== match?.[1]) {
        context.addIssue({
          code: 'custom',
          message: `Enter ${what} as a date and time, such as 2026-12-01 17:00.`,
        });
        return z.NEVER;
      }
      return date.toISOString();
    });
}

/** A tick box: what a form sends, or the boolean that a form library keeps. */
export const checkbox = z
  .union([z.literal('on'), z.literal('true'), z.literal('1'), z.boolean()])
  .optional()
  .transform((value) => value !== undefined && value !== false);
