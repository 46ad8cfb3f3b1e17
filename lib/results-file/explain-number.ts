import type { ProblemCode } from './problem';
import { quoteFound } from './quote-found';

type Explanation = {
  code: ProblemCode;
  /** Words for what was found, where quoting it is not enough. */
  words: string | null;
  /** What to do about it, a sentence; empty when the general sentence says it all. */
  hint: string;
};

type Slip = {
  pattern: RegExp;
  code?: ProblemCode;
  words?: (quoted: string) => string;
  hint: string;
};

const MONTHS = '(jan|feb|m[aä]r|apr|ma[iy]|jun|jul|aug|sep|o[ck]t|nov|de[cz])';
const GROUP_MARKS = " \\u00a0\\u2009\\u202f'\\u2019_";

/** The slips that laboratories' files show most, the more telling first. */
const SLIPS: readonly Slip[] = [
  {
    pattern: /^[+\-\u2212]?(nan|inf|infinity|\u221e)$/i,
    hint: 'Only finite numbers are taken.',
  },
  {
    pattern: /^[+\-\u2212]?0[xob][\da-f]+$/i,
    hint: 'Write it in decimal digits.',
  },
  {
    pattern: /^[+\-\u2212]?[\d.,]+e[+-]?\d{7,}$/i,
    code: 'out-of-range',
    hint: 'The number is too large or too small to be kept.',
  },
  {
    pattern: /^[=@]|^[+-]\s*(\$?[a-z]{1,3}\$?\d|[a-z]+\(|\()|^[+-]\s*[\d.,]+\s*[-+*/^]\s*[\d(]/i,
    code: 'formula',
    words: (quoted) => `found a formula, ${quoted}`,
    hint: 'Write the value that it gives.',
  },
  {
    pattern: /^#(ref|value|n\/a|div\/0|name|num|null|nv|wert)\b/i,
    words: (quoted) => `found ${quoted}, an error value of a spreadsheet`,
    hint: 'Write the value itself.',
  },
  {
    pattern: /^#+$/,
    words: (quoted) => `found ${quoted}, which a spreadsheet shows when the column is too narrow`,
    hint: 'Widen the column and save again.',
  },
  {
    pattern: new RegExp(
      `^\\d{1,4}([-/.])\\d{1,2}\\1\\d{1,4}$|^\\d{1,2}/\\d{1,4}$|` +
        `^\\d{1,4}[-/. ]*${MONTHS}[a-z]*\\b|^${MONTHS}[a-z]*[-/. ]+\\d{1,4}$`,
      'i',
    ),
    words: (quoted) => `found ${quoted}, which looks like a date`,
    hint: 'A spreadsheet may have changed the number: format the column as text or number.',
  },
  {
    pattern: new RegExp(
      `^[<>]?[+\\-\\u2212]?\\d{1,3}(?:[${GROUP_MARKS}]\\d{3})+([.,]\\d*)?$|^[+\\-\\u2212]?\\d{1,3}(?:(,\\d{3})+\\.\\d*|(\\.\\d{3})+,\\d*|(,\\d{3}){2,}|(\\.\\d{3}){2,})$`,
    ),
    code: 'thousands',
    words: (quoted) => `found ${quoted}, which has a mark between thousands`,
    hint: 'Write the digits without it, such as 1234.5 or, in a file with decimal commas, 1234,5.',
  },
  {
    pattern: /^[\u2010-\u2015\ufe63\uff0d]\s*[\d.,]/,
    words: (quoted) => `found ${quoted}, which begins with a dash that is no minus sign`,
    hint: 'Write a hyphen before a negative number.',
  },
  {
    pattern: /[\u00d7*x]\s*10\s*(\^|\*\*|[\u207b\u00b9\u00b2\u00b3\u2070-\u2079]|[+-]?\d)/i,
    hint: 'Write a power of ten as 1.2e-3.',
  },
  { pattern: /\u00b1|\+\/?-/, hint: 'The uncertainty belongs in the column expanded_uncertainty.' },
  { pattern: /^[^%]*\d\s*%$/, hint: 'A percent sign is a unit.' },
  { pattern: /^'/, hint: 'Leave out the apostrophe.' },
];

/** Says what a cell is that is no number. */
export function explainNumber(cell: string): Explanation {
  const slip = SLIPS.find(({ pattern }) => pattern.test(cell));
  if (slip === undefined) return { code: 'not-a-number', words: null, hint: '' };
  const words = slip.words === undefined ? null : slip.words(quoteFound(cell));
  return { code: slip.code ?? 'not-a-number', words, hint: slip.hint };
}
