import 'server-only';
import type { Result } from '@/db/submission-store';
import type { CheckedResult } from '@/lib/results-file';

/** A checked row of a file as it is kept: the laboratory's own text beside the number in the plan's unit. */
export function resultFromRow(submissionId: number, row: CheckedResult): Result {
  return {
    submissionId,
    roundMeasurandId: row.roundMeasurandId,
    replicate: row.replicate,
    line: row.line,
    resultText: row.resultText,
    kind: row.kind,
    value: row.limitOrValue,
    ownValue: row.valueInOwnUnit,
    ownUnit: row.unitText ?? row.unit,
    uncertaintyText: row.expandedUncertaintyText ?? '',
    expandedUncertainty: row.expandedUncertainty,
    coverageFactor: row.coverageFactor,
    loq: row.loq,
    method: row.method ?? '',
    analysedOn: row.analysedOn,
    comment: row.comment ?? '',
  };
}
