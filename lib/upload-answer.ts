import 'server-only';
import { problem } from './http';
import type { ReadFile } from './results-file';

/** Status of a refused file by the code of its first problem; everything else is 422. */
const STATUS: Record<string, number> = { 'too-large': 413, 'too-many-rows': 413, 'not-text': 415 };

/** What a check found, as JSON: every row with the laboratory's own text, so that the sender sees what would be taken. */
export function describeReport(report: ReadFile): Record<string, unknown> {
  return {
    ok: report.ok,
    encoding: report.encoding,
    separator: report.separator,
    decimalMark: report.decimalMark,
    rowCount: report.rowCount,
    ignoredColumns: report.ignoredColumns,
    problems: report.problems,
    unlistedProblems: report.unlistedProblems,
    notices: report.notices,
    unlistedNotices: report.unlistedNotices,
    newLaboratories: report.newLaboratories,
  };
}

/** Problem details for a file that was refused: each problem by line and column. */
export function refusedFile(report: ReadFile): Response {
  const count = report.problems.length + report.unlistedProblems;
  const first = report.problems[0];
  const { problems, ...rest } = describeReport(report);
  return problem({
    code: 'refused-file',
    status: STATUS[first?.code ?? ''] ?? 422,
    title: 'The file was not taken',
    detail:
      count === 1
        ? (first?.message ?? '')
        : `${count} problems; nothing was stored. The first: ${first?.message}`,
    errors: report.problems,
    more: { ...rest, problems },
  });
}
