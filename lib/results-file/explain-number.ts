import type { ProblemCode } from './problem';
import { quoteFound } from './quote-found';

export type Explanation = {
  code: ProblemCode;
  /** Words for what was found, where quoting it is not enough. */
  words: string | null;
  /** What to do about it, a sentence; empty when the general sentence says it all. */
  hint: string;
  /** True when the general sentence has nothing to add to the hint. */
  isWholeHint: boolean;
};

type Slip = {
  pattern: RegExp;
  code?: ProblemCode;
  words?: (quoted: string) => string;
  hint: string;
  isWhole?: true;
};

export const OUT_OF_RANGE: Explanation = {
  code: 'out-of-range',
  words: null,
  hint: 'The number is too large or too small to be kept.',
  isWholeHint: true,
};

const MONTHS = '(jan|feb|m[aä]r|apr|ma[iy]|jun|jul|aug|sep|o[ck]t|nov|de[cz])';
const GROUP_MARKS = " \\u00a0\\u2009\\u202f'\\u2019_";

const DATE = new RegExp(
  `^\\d{1,4}([-/.])\\d{1,2}\\1\\d{1,4}$|^\\d{1,2}/\\d{1,4}$|` +
    `^\\d{1,4}[-/. ]*${MONTHS}[a-z]*\\b|^${MONTHS}[a-z]*[-/. ]+\\d{1,4}$`,
  'i',
);
const THOUSANDS = new RegExp(
  `^[+\\-\\u2212]?\\d{1,3}([${GROUP_MARKS}]\\d{3})+([.,]\\d*)?$|` +
    `^[+\\-\\u2212]?\\d{1,3}((,\\d{3})+\\.\\d*|(\\.\\d{3})+,\\d*|(,\\d{3}){2,}|(\\.\\d{3}){2,})$`,
);

/** The slips that laboratories' files show most, the more telling first. */
const SLIPS: readonly Slip[] = [
  { pattern: /^[+\-\u2212]?(nan|inf|infinity|\u221e)$/i, hint: 'Only finite numbers are taken.' },
  { pattern: /^[+\-\u2212]?0[xob][\da-f]+$/i, hint: 'Write it in decimal digits.', isWhole: true },
  {
    pattern: /^[+\-\u2212]?[\d.,]+e[+-]?\d{7,}$/i,
    code: OUT_OF_RANGE.code,
    hint: OUT_OF_RANGE.hint,
    isWhole: true,
  },
  {
    pattern: /^[=@]|^[+-]\s*(\$?[a-z]{1,3}\$?\d|[a-z]+\(|\()|^[+-]\s*[\d.,]+\s*[-+*/^]\s*[\d(]/i,
    code: 'formula',
    words: (quoted) => `found a formula, ${quoted}`,
    hint: 'Write the value that it gives.',
    isWhole: true,
  },
  {
    pattern: /^#(ref|value|n\/a|div\/0|name|num|null|nv|wert)(?![a-z])/i,
    words: (quoted) => `found ${quoted}, an error value of a spreadsheet`,
    hint: 'Write the value itself.',
    isWhole: true,
  },
  {
    pattern: /^#+$/,
    words: (quoted) => `found ${quoted}, which a spreadsheet shows when the column is too narrow`,
    hint: 'Widen the column and save again.',
    isWhole: true,
  },
  {
    pattern: DATE,
    words: (quoted) => `found ${quoted}, which looks like a date`,
    hint: 'A spreadsheet may have changed the number: format the column as text or number.',
    isWhole: true,
  },
  {
    pattern: THOUSANDS,
    code: 'thousands',
    words: (quoted) => `found ${quoted}, which has a mark between thousands`,
    hint: 'Write the digits without it, such as 1234.5 or, in a file with decimal commas, 1234,5.',
    isWhole: true,
  },
  {
    pattern: /^[\u2010-\u2015\ufe63\uff0d]\s*[\d.,]/,
    words: (quoted) => `found ${quoted}, which begins with a dash that is no minus sign`,
    hint: 'Write a hyphen before a negative number.',
    isWhole: true,
  },
  {
    pattern: /[\u00d7*x]\s*10\s*(\^|\*\*|[\u207b\u00b9\u00b2\u00b3\u2070-\u2079]|[+-]?\d)/i,
    hint: 'Write a power of ten as 1.2e-3 or, in a file with decimal commas, 1,2e-3.',
    isWhole: true,
  },
  { pattern: /\u00b1|\+\/?-/, hint: 'The uncertainty belongs in the column expanded_uncertainty.' },
  { pattern: /^[^%]*\d\s*%$/, hint: 'A percent sign is a unit.' },
  { pattern: /^'/, hint: 'Leave out the apostrophe.', isWhole: true },
];

/**
 * Says what a cell is that is no number.
 *
 * @param shown - the text that a message quotes: the whole cell.
 */
export function explainNumber(cell: string, shown: string): Explanation {
  const slip = SLIPS.find(({ pattern }) => pattern.test(cell));
  if (slip === undefined) return { code: 'not-a-number', words: null, hint: '', isWholeHint: false };
  const words = slip.words === undefined ? null : slip.words(quoteFound(shown));
  const { code = 'not-a-number', hint, isWhole = false } = slip;
  return { code, words, hint, isWholeHint: isWhole };
}
