import { formatStatistic } from './stats/display/format-statistic';
import { displayScore } from './stats/scores/display-score';
import type { ScoreKind } from './stats/scores/limits';

export type { ScoreKind } from './stats/scores/limits';

const MINUS = '\u2212';
const ABSENT = '\u2013';
const MONTHS = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'];
const DAY_MS = 86_400_000;

/** The figure as text for files and the clipboard: ASCII minus, decimal point, '' when absent. */
export function formatPlainNumber(value: number | null | undefined, decimals: number): string {
  if (value === null || value === undefined || !Number.isFinite(value)) return '';
  return formatStatistic(value, decimals);
}

/** The figure as shown on screen and paper: a true minus sign, decimal point, an en dash when absent. */
export function formatNumber(value: number | null | undefined, decimals: number): string {
  return showMinus(formatPlainNumber(value, decimals)) || ABSENT;
}

/** Replaces the hyphen of a figure written by a computer or a laboratory by a true minus sign. */
export function showMinus(text: string): string {
  return text.replace(/(^|[<>=\s(])-(?=[\d.])/g, `$1${MINUS}`).replace(/([eE])-(?=\d)/g, `$1${MINUS}`);
}

/** Digits after the decimal point of a figure as written; an exponent or a remark behind it is left aside. */
export function countDecimals(text: string): number {
  return /^[^\s.]*\.(\d+)/.exec(text)?.[1]?.length ?? 0;
}

/** Figures to show for a number whose column has no fixed decimals: three or more significant digits. */
export function formatSignificant(value: number | null | undefined, digits: number): string {
  if (value === null || value === undefined || !Number.isFinite(value)) return ABSENT;
  return showMinus(String(Number(value.toPrecision(digits))));
}

/** A score with two decimals, and more where two would show it on the other side of a limit. */
export function formatScore(score: number | null | undefined, kind: ScoreKind = 'z'): string {
  return showMinus(formatPlainScore(score, kind)) || ABSENT;
}

export function formatPlainScore(score: number | null | undefined, kind: ScoreKind = 'z'): string {
  if (score === null || score === undefined || !Number.isFinite(score)) return '';
  return displayScore(score, kind);
}

export function formatDate(iso: string | null | undefined): string {
  if (!iso) return ABSENT;
  const at = toDate(iso);
  return `${at.getUTCDate()} ${MONTHS[at.getUTCMonth()]} ${at.getUTCFullYear()}`;
}

export function formatTime(iso: string | null | undefined): string {
  if (!iso) return ABSENT;
  return `${toDate(iso).toISOString().slice(11, 16)} UTC`;
}

export function formatDateTime(iso: string | null | undefined): string {
  if (!iso) return ABSENT;
  return `${formatDate(iso)}, ${formatTime(iso)}`;
}

/** Whole calendar days (UTC) from now to then; negative when then has passed. */
export function daysBetween(now: string, then: string): number {
  const dayOf = (iso: string) => Math.floor(toDate(iso).getTime() / DAY_MS);
  return dayOf(then) - dayOf(now);
}

export function formatRelativeDays(iso: string | null | undefined, now: string): string {
  if (!iso) return ABSENT;
  const days = daysBetween(now, iso);
  if (days === 0) return 'today';
  if (days === 1) return 'tomorrow';
  if (days === -1) return 'yesterday';
  return days > 0 ? `in ${days} days` : `${-days} days ago`;
}

/** Decimal units, as file managers and network tools use them: 1 kB is 1000 bytes. */
export function formatBytes(bytes: number): string {
  if (!Number.isFinite(bytes) || bytes < 0) return ABSENT;
  if (bytes < 1000) return formatCount(Math.round(bytes), 'byte');
  const units = ['kB', 'MB', 'GB', 'TB'];
  let size = bytes / 1000;
  let unit = 0;
  while (Number(size.toPrecision(3)) >= 1000 && unit < units.length - 1) {
    size /= 1000;
    unit += 1;
  }
  return `${Number(size.toPrecision(size < 100 ? 2 : 3))} ${units[unit]}`;
}

/** "1 laboratory", "34 laboratories": the plural defaults to the singular with an s. */
export function formatCount(count: number, singular: string, plural = `${singular}s`): string {
  return `${count} ${count === 1 ? singular : plural}`;
}

function toDate(iso: string): Date {
  const at = new Date(iso);
  if (Number.isNaN(at.getTime()))
    throw new RangeError(`not a date: "${iso}"; expected ISO 8601, as 2026-12-01T14:05Z`);
  return at;
}
