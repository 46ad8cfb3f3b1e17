import { streamFor } from '../story/random';

// As the services draw them, but from the seed: four digits, and three groups of Crockford's base 32.
const LOWEST = 1_000;
const HIGHEST = 9_999;
const BASE_32 = '0123456789ABCDEFGHJKMNPQRSTVWXYZ';
const BASE_62 = '0123456789ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz';

/** A code for each laboratory of a round, new in every round. */
export function participantCodes(round: string, laboratories: readonly string[]): Map<string, string> {
  const stream = streamFor('participant codes', round);
  const taken = new Set<string>();
  return new Map(
    laboratories.map((laboratory) => {
      let code = '';
      do code = String(stream.integer(LOWEST, HIGHEST));
      while (taken.has(code));
      taken.add(code);
      return [laboratory, code];
    }),
  );
}

function drawText(name: readonly (string | number)[], alphabet: string, length: number): string {
  const stream = streamFor(...name);
  return Array.from({ length }, () => alphabet[stream.integer(0, alphabet.length - 1)]).join('');
}

export function receiptCode(round: string, laboratory: string, number: number): string {
  const text = drawText(['receipt', round, laboratory, number], BASE_32, 12);
  return [text.slice(0, 4), text.slice(4, 8), text.slice(8)].join('-');
}

/** The part of a token behind its prefix. */
export function tokenBody(laboratory: string): string {
  return drawText(['token', laboratory], BASE_62, 40);
}
