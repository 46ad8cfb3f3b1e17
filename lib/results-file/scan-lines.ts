import type { Separator } from './columns';
import { MAX_CELL, MAX_LINE, MAX_LINES } from './limits';

export type LineDefect =
  /** line: where the quote opens. */
  | { kind: 'unclosed-quote'; line: number; found: string }
  /** closeLine: where the quote closes and more text follows. */
  | { kind: 'stray-quote'; line: number; closeLine: number; found: string }
  | { kind: 'line-too-long'; line: number; found: string }
  | { kind: 'too-many-lines'; found: string };

/** Looks for lines without end, which would fill the memory once they are split. */
export function findLongLine(text: string): LineDefect | null {
  let line = 1;
  for (let start = 0; start < text.length; line += 1) {
    const end = nextIndex(text, '\n', start);
    if (end - start > MAX_LINE) {
      return { kind: 'line-too-long', line, found: `${(end - start).toLocaleString('en-GB')} characters` };
    }
    start = end + 1;
    if (line > MAX_LINES) {
      return { kind: 'too-many-lines', found: `more than ${MAX_LINES.toLocaleString('en-GB')} lines` };
    }
  }
  return null;
}

/**
 * Looks for a quote that is never closed and for text after a closing quote. The parser would carry on through
 * both and swallow the rest of the file.
 *
 * @param text - lines end with a line feed only.
 */
export function findQuoteDefect(text: string, separator: Separator): LineDefect | null {
  if (!text.includes('"')) return null;
  let line = 1;
  let at = 0;
  while (at < text.length) {
    if (text[at] === '"') {
      const close = closingQuote(text, at);
      const found = text.slice(at, Math.min(nextIndex(text, '\n', at), at + MAX_CELL));
      if (close === -1) return { kind: 'unclosed-quote', line, found };
      const closeLine = line + countLineFeeds(text, at, close);
      const after = skipSpaces(text, close + 1, separator);
      const next = text[after];
      if (next !== undefined && next !== separator && next !== '\n') {
        return { kind: 'stray-quote', line, closeLine, found };
      }
      line = closeLine;
      at = after;
    } else {
      while (at < text.length && text[at] !== separator && text[at] !== '\n') at += 1;
    }
    if (text[at] === '\n') line += 1;
    at += 1;
  }
  return null;
}

function closingQuote(text: string, open: number): number {
  let at = text.indexOf('"', open + 1);
  while (at !== -1 && text[at + 1] === '"') at = text.indexOf('"', at + 2);
  return at;
}

function skipSpaces(text: string, from: number, separator: Separator): number {
  let at = from;
  while (text[at] === ' ' || (text[at] === '\t' && separator !== '\t')) at += 1;
  return at;
}

function nextIndex(text: string, sign: string, from: number): number {
  const at = text.indexOf(sign, from);
  return at === -1 ? text.length : at;
}

export function countLineFeeds(text: string, from: number, to: number): number {
  let count = 0;
  for (let at = text.indexOf('\n', from); at !== -1 && at < to; at = text.indexOf('\n', at + 1)) count += 1;
  return count;
}
