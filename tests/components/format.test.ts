import { describe, expect, it } from 'vitest';
import {
  countDecimals,
  daysBetween,
  formatBytes,
  formatCount,
  formatDate,
  formatDateTime,
  formatNumber,
  formatPlainNumber,
  formatRelativeDays,
  formatScore,
  formatSignificant,
  formatTime,
  showMinus,
} from '@/lib/format';

const MINUS = '\u2212';
const NOW = '2026-12-01T14:05:00Z';

describe('numbers', () => {
  it('writes a true minus sign on screen and a hyphen for files', () => {
    expect(formatNumber(-2.5, 2)).toBe(`${MINUS}2.50`);
    expect(formatPlainNumber(-2.5, 2)).toBe('-2.50');
  });

  it('never shows a negative zero', () => {
    expect(formatNumber(-0.001, 2)).toBe('0.00');
    expect(formatNumber(-0, 0)).toBe('0');
  });

  it('shows a dash for what is absent and leaves it empty in files', () => {
    for (const absent of [null, undefined, Number.NaN, Infinity]) {
      expect(formatNumber(absent, 2)).toBe('\u2013');
      expect(formatPlainNumber(absent, 2)).toBe('');
      expect(formatScore(absent)).toBe('\u2013');
      expect(formatSignificant(absent, 3)).toBe('\u2013');
    }
  });

  it('rounds as a person rounds what is written, half to even', () => {
    expect(formatNumber(0.285, 2)).toBe('0.28');
    expect(formatNumber(1.005, 2)).toBe('1.00');
    expect(formatNumber(1.015, 2)).toBe('1.02');
  });

  it('shows a score with more decimals where two would move it across a limit', () => {
    expect(formatScore(2.998)).toBe('2.998');
    expect(formatScore(-2.0004)).toBe(`${MINUS}2.0004`);
    expect(formatScore(2)).toBe('2.00');
    expect(formatScore(1.0004, 'e-n')).toBe('1.0004');
  });

  it('keeps what a laboratory wrote but for the sign', () => {
    expect(showMinus('<-2.0')).toBe(`<${MINUS}2.0`);
    expect(showMinus('1.2e-5')).toBe(`1.2e${MINUS}5`);
    expect(showMinus('LC-MS/MS')).toBe('LC-MS/MS');
  });

  it('counts decimals as written', () => {
    expect([countDecimals('12'), countDecimals('<2.0'), countDecimals('1.250e3')]).toEqual([0, 1, 3]);
  });

  it('rounds to significant digits', () => {
    expect(formatSignificant(0.0012345, 3)).toBe('0.00123');
    expect(formatSignificant(-1234.5, 2)).toBe(`${MINUS}1200`);
  });
});

describe('dates', () => {
  it('writes dates and times in UTC', () => {
    expect(formatDate(NOW)).toBe('1 Dec 2026');
    expect(formatDateTime(NOW)).toBe('1 Dec 2026, 14:05 UTC');
    expect(formatTime('2026-09-05T03:07:59+02:00')).toBe('01:07 UTC');
  });

  it('refuses what is not a date and says what is right', () => {
    expect(() => formatDate('soon')).toThrow('not a date: "soon"; expected ISO 8601');
  });

  it('counts calendar days, not spans of 24 hours', () => {
    expect(daysBetween('2026-12-01T23:59:00Z', '2026-12-02T00:01:00Z')).toBe(1);
    expect(daysBetween('1969-12-31T12:00:00Z', '1970-01-01T00:00:00Z')).toBe(1);
  });

  it.each([
    ['2026-12-01T00:00:00Z', 'today'],
    ['2026-12-02T00:00:00Z', 'tomorrow'],
    ['2026-11-30T23:00:00Z', 'yesterday'],
    ['2026-12-04T09:00:00Z', 'in 3 days'],
    ['2026-11-29T09:00:00Z', '2 days ago'],
  ])('tells %s from now as "%s"', (then, words) => {
    expect(formatRelativeDays(then, NOW)).toBe(words);
  });

  it('shows a dash without a date', () => {
    expect([
      formatDate(null),
      formatDateTime(null),
      formatTime(undefined),
      formatRelativeDays(null, NOW),
    ]).toEqual(Array(4).fill('\u2013'));
  });
});

describe('sizes and counts', () => {
  it.each([
    [0, '0 bytes'],
    [1, '1 byte'],
    [999, '999 bytes'],
    [1000, '1 kB'],
    [1234, '1.2 kB'],
    [999_950, '1 MB'],
    [52_428_800, '52 MB'],
    [123_456_789, '123 MB'],
    [-1, '\u2013'],
  ])('writes %d as "%s"', (bytes, text) => {
    expect(formatBytes(bytes)).toBe(text);
  });

  it('uses the plural it is given', () => {
    expect(formatCount(1, 'laboratory', 'laboratories')).toBe('1 laboratory');
    expect(formatCount(34, 'laboratory', 'laboratories')).toBe('34 laboratories');
    expect(formatCount(0, 'result')).toBe('0 results');
  });
});
