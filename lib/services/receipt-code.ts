import 'server-only';
import { randomInt } from 'node:crypto';

// Crockford's base 32 alphabet: no I, L, O or U, so that a code read aloud or typed from paper stays right.
const ALPHABET = '0123456789ABCDEFGHJKMNPQRSTVWXYZ';
const GROUPS = 3;
const GROUP_LENGTH = 4;

/** A code of 60 random bits such as `7QK2-0XNB-4TRM`. */
export function drawReceiptCode(): string {
  const group = () =>
    Array.from({ length: GROUP_LENGTH }, () => ALPHABET[randomInt(ALPHABET.length)]).join('');
  return Array.from({ length: GROUPS }, group).join('-');
}
