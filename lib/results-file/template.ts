import { knownColumns } from './columns';
import type { ResultsPlan } from './plan';
import { writeCsv, type CsvOptions, type CsvRow } from './write-csv';

/**
 * The file that a laboratory fills in: one row for each item, measurand and replicate of the plan, the unit filled
 * in and the result empty. A laboratory with one method sheet finds its code filled in too.
 */
export function resultsTemplate(plan: ResultsPlan, options: TemplateOptions = {}): string {
  return writeCsv(planRows(plan), knownColumns('laboratory'), options);
}

/** The same for a whole round: those rows for each of the plan's laboratories, or once without a name. */
export function wholeRoundTemplate(plan: ResultsPlan, options: TemplateOptions = {}): string {
  const names = plan.laboratories?.length ? plan.laboratories.map((laboratory) => laboratory.name) : [''];
  const rows = names.flatMap((laboratory) => planRows(plan).map((row) => ({ laboratory, ...row })));
  return writeCsv(rows, knownColumns('whole-round'), options);
}

type TemplateOptions = Pick<CsvOptions, 'separator'>;

function planRows(plan: ResultsPlan): CsvRow[] {
  const method = plan.methods?.length === 1 ? plan.methods[0] : '';
  return plan.measurands.flatMap(({ item, measurand, unit, replicates }) =>
    Array.from({ length: replicates }, (_, index) => ({
      item,
      measurand,
      replicate: index + 1,
      unit,
      method,
    })),
  );
}
