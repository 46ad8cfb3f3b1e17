import * as z from 'zod';
import { requiredText } from './fields';
import { idNumber } from './people';

export const TOKEN_NAME_LENGTH = 60;
export const TOKEN_YEARS = 2;

const DATE = /^\d{4}-\d{2}-\d{2}$/;

/** The last day a token made today may have. */
export function lastTokenDay(today: Date): string {
  const day = new Date(today);
  day.setUTCFullYear(day.getUTCFullYear() + TOKEN_YEARS);
  return day.toISOString().slice(0, 10);
}

/** A token is good through its last day (UTC). */
export function endOfDay(date: string): string {
  return `${date}T23:59:59.999Z`;
}

function isRealDate(text: string): boolean {
  return DATE.test(text) && !Number.isNaN(Date.parse(text)) && new Date(text).toISOString().startsWith(text);
}

export const newTokenSchema = z.object({
  name: requiredText('a name', TOKEN_NAME_LENGTH),
  expiresOn: z
    .string({ error: 'Enter a last day.' })
    .trim()
    .refine(isRealDate, 'Enter a last day as a date, such as 2027-06-30.')
    .refine((date) => !isRealDate(date) || date >= new Date().toISOString().slice(0, 10), {
      error: 'Enter a last day that has not passed.',
    })
    .refine((date) => !isRealDate(date) || date <= lastTokenDay(new Date()), {
      error: `Enter a last day within ${TOKEN_YEARS} years from today.`,
    }),
});

export const revokeTokenSchema = z.object({ id: idNumber });

export type NewTokenInput = z.output<typeof newTokenSchema>;
