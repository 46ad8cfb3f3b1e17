import { COLUMNS } from './columns';
import { decideDecimalMark } from './decimal-mark';
import { indexPlan } from './plan-index';
import type { ResultsPlan } from './plan';
import type { Problem } from './problem';
import { RowChecker } from './row-checker';
import { Roll } from './roll';
import type { CheckedFile, CheckedResult, CheckOptions, DecimalMark, FileKind } from './result-types';
import type { Table } from './table';

/** Checks the rows of a laboratory's own file against the plan of the round. */
export function checkResults(table: Table, plan: ResultsPlan, options: CheckOptions): CheckedFile {
  return checkTable(table, plan, { ...options, kind: 'laboratory' });
}

/** Checks the rows of a whole round, one a laboratory and result. The table must have been read as such. */
export function checkWholeRound(table: Table, plan: ResultsPlan, options: CheckOptions): CheckedFile {
  return checkTable(table, plan, { ...options, kind: 'whole-round' });
}

function checkTable(
  table: Table,
  plan: ResultsPlan,
  options: CheckOptions & { kind: FileKind },
): CheckedFile {
  const { findings } = table;
  const roll = new Roll(plan, options.kind);
  const results: CheckedResult[] = [];
  let mark: DecimalMark | null = null;
  if (table.usable) {
    const decided = decideDecimalMark(table, findings);
    if (decided.ok) {
      mark = decided.mark;
      const checker = new RowChecker({ table, index: indexPlan(plan), roll, mark, ...options });
      for (const row of table.rows) {
        const result = checker.check(row);
        if (result !== null) results.push(result);
      }
      if (findings.problemCount === 0) roll.notice(findings);
    }
  }
  inReadingOrder(findings.problems);
  return {
    ok: findings.problemCount === 0,
    results,
    problems: findings.problems,
    unlistedProblems: findings.unlistedProblems,
    notices: findings.notices,
    unlistedNotices: findings.unlistedNotices,
    decimalMark: mark,
    separator: table.separator,
    rowCount: table.rowCount,
    ignoredColumns: [...table.ignoredColumns],
    newLaboratories: roll.newLaboratories,
  };
}

/** By line, and within a line from the first column to the last. */
function inReadingOrder(problems: Problem[]): void {
  const place = (column: string | null) => (COLUMNS as readonly (string | null)[]).indexOf(column);
  problems.sort((a, b) => (a.line ?? 0) - (b.line ?? 0) || place(a.column) - place(b.column));
}
