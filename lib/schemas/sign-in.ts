import * as z from 'zod';
import { checkbox, requiredText } from './fields';

export const EMAIL_LENGTH = 254;
export const PASSWORD_MIN = 12;
export const PASSWORD_MAX = 200;
const DIFFERENT_CHARACTERS = 5;

export const PASSWORD_HINT = `At least ${PASSWORD_MIN} characters. A few unrelated words are good.`;

/** Passwords of twelve characters and more that are tried first by anyone who guesses. From memory, no source. */
const COMMON = [
  '123456789012',
  '1234567890123',
  '12345678901234',
  '123456789123',
  '0123456789ab',
  'abcdefghijkl',
  'abcdefghijklm',
  'administrator',
  'adminpassword',
  'changemenow1',
  'correcthorsebatterystaple',
  'iloveyouforever',
  'laboratory123',
  'laboratory1234',
  'letmeinletmein',
  'mypassword123',
  'p@ssw0rd1234',
  'passwordpassword',
  'password12345',
  'password1234',
  'password123!',
  'password1234!',
  'proficiency1',
  'qazwsxedcrfv',
  'qwerty123456',
  'qwertyuiop12',
  'qwertyuiop123',
  'qwertyuiopasdf',
  'welcome12345',
  'welcomewelcome',
];

/** What is wrong with a password somebody wants to set, or null. */
export function passwordComplaint(password: string, owner: { email: string; name: string }): string | null {
  const plain = password.toLowerCase().trim();
  if (password.length < PASSWORD_MIN)
    return `Enter at least ${PASSWORD_MIN} characters; this has ${password.length}.`;
  if (password.length > PASSWORD_MAX) return `Enter at most ${PASSWORD_MAX} characters.`;
  if (plain === owner.email.toLowerCase() || plain === owner.name.toLowerCase())
    return 'Enter something other than your e-mail or name.';
  if (COMMON.includes(plain)) return 'This is among the passwords that are guessed first. Enter another.';
  if (new Set(plain).size < DIFFERENT_CHARACTERS)
    return `Enter at least ${DIFFERENT_CHARACTERS} different characters.`;
  return null;
}

export const emailText = z
  .string({ error: 'Enter an e-mail address.' })
  .trim()
  .toLowerCase()
  .min(1, 'Enter an e-mail address.')
  .max(EMAIL_LENGTH, `Enter an e-mail address of at most ${EMAIL_LENGTH} characters.`)
  .pipe(z.email('Enter an e-mail address such as name@laboratory.example.'));

const password = z
  .string({ error: 'Enter a password.' })
  .min(1, 'Enter a password.')
  .max(PASSWORD_MAX, `Enter at most ${PASSWORD_MAX} characters.`);

const newPassword = {
  password,
  passwordAgain: z.string({ error: 'Enter the password again.' }).max(PASSWORD_MAX),
};

function sameTwice(fields: { password: string; passwordAgain: string }): boolean {
  return fields.password === fields.passwordAgain;
}

const DIFFERENT = { path: ['passwordAgain'], error: 'The two passwords differ. Enter the same one twice.' };

export const signInSchema = z.object({
  email: emailText,
  password,
  from: z.string().max(2_000).optional(),
});

export const resetRequestSchema = z.object({ email: emailText });

export const linkPasswordSchema = z
  .object({ link: z.string().min(1).max(200), ...newPassword })
  .refine(sameTwice, DIFFERENT);

export const changePasswordSchema = z
  .object({ currentPassword: password, ...newPassword })
  .refine(sameTwice, DIFFERENT);

export const setUpSchema = z
  .object({
    name: requiredText('your name'),
    email: emailText,
    ...newPassword,
    isCoordinator: checkbox,
  })
  .refine(sameTwice, DIFFERENT);

export type SetUpInput = z.output<typeof setUpSchema>;
