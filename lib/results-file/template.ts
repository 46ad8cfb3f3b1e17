import { knownColumns } from './columns';
import type { ResultsPlan } from './plan';
import { writeCsv, type CsvOptions, type CsvRow } from './write-csv';

/**
 * The file that a laboratory fills in: one row for each item, measurand and replicate of the plan, the unit filled
 * in and the result empty. A laboratory with one method sheet finds its code filled in too.
 */
export function resultsTemplate(plan: ResultsPlan, options: Pick<CsvOptions, 'separator'> = {}): string {
  const method = plan.methods?.length === 1 ? plan.methods[0] : '';
  const rows: CsvRow[] = plan.measurands.flatMap(({ item, measurand, unit, replicates }) =>
    Array.from({ length: replicates }, (_, index) => ({
      item,
      measurand,
      replicate: index + 1,
      unit,
      method,
    })),
  );
  return writeCsv(rows, knownColumns('laboratory'), options);
}
