import { SEPARATOR_WORDS } from '@/lib/results-file/columns';
import { formatCount } from '@/lib/format';
import type { CheckReport } from './upload-outcome';

const MARK_WORDS = { '.': 'decimal point', ',': 'decimal comma' };

/** One sentence on the outcome of a check and one on how the bytes were read. */
export function reportSummary(report: CheckReport): { title: string; text: string } {
  const how = [
    report.encoding,
    report.separator && `separated by ${SEPARATOR_WORDS[report.separator]}`,
    report.decimalMark && MARK_WORDS[report.decimalMark],
  ].filter(Boolean);
  const reading = how.length > 0 ? ` Read as ${how.join(', ')}.` : '';
  if (report.ok) {
    const rows = formatCount(report.rowCount, 'row');
    return { title: `${rows} checked, no problem.`, text: `Nothing is submitted yet.${reading}` };
  }
  const count = report.problems.length + report.unlistedProblems;
  return {
    title: `${formatCount(count, 'problem')} in this file.`,
    text: `Nothing was stored. Mend the file and choose it again.${reading}`,
  };
}
