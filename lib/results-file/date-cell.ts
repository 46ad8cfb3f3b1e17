import type { ProblemCode } from './problem';

export type ReadDate = { ok: true } | { ok: false; code: ProblemCode; expected: string };

const ISO_DATE = /^(\d{4})-(\d{2})-(\d{2})$/;
const EARLIEST_YEAR = 1900;

/** Takes a real calendar date as YYYY-MM-DD that is not after today. */
export function readDate(cell: string, today: string): ReadDate {
  const parts = ISO_DATE.exec(cell);
  const [year, month, day] = [Number(parts?.[1]), Number(parts?.[2]), Number(parts?.[3])];
  if (parts === null || year < EARLIEST_YEAR || !isRealDate(year, month, day)) {
    return { ok: false, code: 'bad-date', expected: wordsFor(cell, parts !== null) };
  }
  if (cell > today) {
    return { ok: false, code: 'future-date', expected: `Write a date that is not after today, ${today}.` };
  }
  return { ok: true };
}

function isRealDate(year: number, month: number, day: number): boolean {
  const date = new Date(Date.UTC(year, month - 1, day));
  return date.getUTCMonth() === month - 1 && date.getUTCDate() === day;
}

function wordsFor(cell: string, isShaped: boolean): string {
  if (isShaped) return 'No calendar has that day. Write a date as 2026-03-31: year, month, day.';
  if (/^\d{5}$/.test(cell)) {
    return 'It looks like a day number of a spreadsheet. Write a date as 2026-03-31: year, month, day.';
  }
  return 'Write a date as 2026-03-31: year, month, day, without a time.';
}
