import { checkResults, checkWholeRound } from './check-results';
import { decodeFile } from './decode-file';
import type { ResultsPlan } from './plan';
import { Findings, type Problem } from './problem';
import { quoteFound } from './quote-found';
import { readTable } from './read-table';
import type { CheckedFile, ReadFile, ReadOptions } from './result-types';

/**
 * Reads the bytes of an upload and checks every row against the plan. Bad input is told in problems, never thrown.
 *
 * @param options.kind - a laboratory's own file, or a whole round with a column laboratory.
 * @param options.today - YYYY-MM-DD; no analysis is dated after it.
 */
export function readResultsFile(bytes: Uint8Array, plan: ResultsPlan, options: ReadOptions): ReadFile {
  const decoded = decodeFile(bytes);
  if (!decoded.ok) return { ...refusedFile(decoded.problem), encoding: null };
  const { text, encoding } = decoded;
  const table = readTable(text, options.kind);
  if (encoding === 'Windows-1252') noticeEncoding(text, table.findings);
  const check = options.kind === 'whole-round' ? checkWholeRound : checkResults;
  return { ...check(table, plan, { today: options.today }), encoding };
}

function noticeEncoding(text: string, findings: Findings): void {
  const sample = quoteFound(/[\p{L}/%]*[^\u0000-\u007f][\p{L}/%]*/u.exec(text)?.[0] ?? '');
  const words = `The file is not UTF-8 and was read as Windows-1252. Check its special characters, such as ${sample}.`;
  findings.notice('encoding', null, null, words);
}

function refusedFile(problem: Problem): CheckedFile {
  return {
    ok: false,
    results: [],
    problems: [problem],
    unlistedProblems: 0,
    notices: [],
    unlistedNotices: 0,
    decimalMark: null,
    separator: null,
    rowCount: 0,
    ignoredColumns: [],
    newLaboratories: [],
  };
}
