import { MAX_NOTICES, MAX_PROBLEMS } from './limits';
import { quoteFound } from './quote-found';

export type ProblemCode =
  | 'too-large'
  | 'empty-file'
  | 'not-text'
  | 'bad-encoding'
  | 'nul-byte'
  | 'no-rows'
  | 'line-too-long'
  | 'unclosed-quote'
  | 'stray-quote'
  | 'duplicate-column'
  | 'missing-column'
  | 'too-many-rows'
  | 'row-length'
  | 'cell-too-long'
  | 'control-character'
  | 'mixed-decimal-marks'
  | 'ambiguous-decimal-comma'
  | 'empty-cell'
  | 'unknown-laboratory'
  | 'unknown-item'
  | 'unknown-measurand'
  | 'not-in-item'
  | 'bad-replicate'
  | 'duplicate-row'
  | 'formula'
  | 'thousands'
  | 'not-a-number'
  | 'out-of-range'
  | 'loq-missing'
  | 'reason-missing'
  | 'unknown-unit'
  | 'other-unit'
  | 'unknown-method'
  | 'bad-date'
  | 'future-date'
  | 'comment-too-long';

/** Something that must be mended before the file is taken. */
export type Problem = {
  code: ProblemCode;
  /** Physical line, counted from 1; null: the whole file. */
  line: number | null;
  /** Header name of the column; null: the whole line or file. */
  column: string | null;
  /** What the file has, shortened and made visible. */
  found: string;
  /** What would be right, as a sentence. */
  expected: string;
  /** The whole, to be read aloud: place, what was found, what would be right. */
  message: string;
};

export type NoticeCode =
  | 'encoding'
  | 'ignored-column'
  | 'negative'
  | 'zero'
  | 'minus-sign'
  | 'below-loq'
  | 'decimal-comma'
  | 'not-reported'
  | 'new-laboratory';

/** Something worth a look that does not stand against submitting. */
export type Notice = { code: NoticeCode; line: number | null; column: string | null; message: string };

type Complaint = {
  code: ProblemCode;
  line?: number;
  column?: string;
  /** The text as it stands in the file. */
  found: string;
  expected: string;
  /** Words for what was found, when quoting it would not do. */
  foundWords?: string;
};

/** "Line 12, result: "; empty for the whole file. */
export function placeOf(line: number | null, column: string | null): string {
  if (line === null) return column === null ? '' : `Column ${column}: `;
  return column === null ? `Line ${line}: ` : `Line ${line}, ${column}: `;
}

export function makeProblem({ code, line, column, found, expected, foundWords }: Complaint): Problem {
  const place = placeOf(line ?? null, column ?? null);
  const words = foundWords ?? `found ${quoteFound(found)}`;
  const sentence = place === '' ? words.charAt(0).toUpperCase() + words.slice(1) : words;
  return {
    code,
    line: line ?? null,
    column: column ?? null,
    found: quoteFound(found).replace(/^"|"$/g, ''),
    expected,
    message: `${place}${sentence}. ${expected}`,
  };
}

/** Gathers problems and notices; lists the first ones and counts the rest, so that a bad file costs no memory. */
export class Findings {
  readonly problems: Problem[] = [];
  readonly notices: Notice[] = [];
  unlistedProblems = 0;
  unlistedNotices = 0;

  problem(complaint: Complaint): void {
    if (this.problems.length < MAX_PROBLEMS) this.problems.push(makeProblem(complaint));
    else this.unlistedProblems += 1;
  }

  notice(code: NoticeCode, line: number | null, column: string | null, words: string): void {
    if (this.notices.length >= MAX_NOTICES) this.unlistedNotices += 1;
    else this.notices.push({ code, line, column, message: `${placeOf(line, column)}${words}` });
  }

  /** How many problems there are, listed or not. */
  get problemCount(): number {
    return this.problems.length + this.unlistedProblems;
  }
}
