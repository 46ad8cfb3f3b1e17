import 'server-only';
import type { ScoreRow } from '@/db/evaluation-store';

/** Score rows by column; NaN stands for a missing number. A hundred thousand rows pass between threads as five blocks. */
export type PackedScores = {
  readonly roundMeasurandIds: Float64Array<ArrayBuffer>;
  readonly enrolmentIds: Float64Array<ArrayBuffer>;
  readonly values: Float64Array<ArrayBuffer>;
  readonly scores: Float64Array<ArrayBuffer>;
  readonly signals: Uint8Array<ArrayBuffer>;
};

const SIGNALS = ['none', 'warning', 'action', 'not-scored'] as const satisfies readonly ScoreRow['signal'][];

export function packScores(rows: readonly ScoreRow[]): PackedScores {
  return {
    roundMeasurandIds: Float64Array.from(rows, (row) => row.roundMeasurandId),
    enrolmentIds: Float64Array.from(rows, (row) => row.enrolmentId),
    values: Float64Array.from(rows, (row) => row.value ?? NaN),
    scores: Float64Array.from(rows, (row) => row.score ?? NaN),
    signals: Uint8Array.from(rows, (row) => SIGNALS.indexOf(row.signal)),
  };
}

/** The rows one by one, so that they never all exist at once. */
export function* unpackScores(packed: PackedScores): Generator<ScoreRow> {
  const numberOrNull = (value: number | undefined) =>
    value === undefined || Number.isNaN(value) ? null : value;
  for (let i = 0; i < packed.signals.length; i += 1) {
    yield {
      roundMeasurandId: packed.roundMeasurandIds[i] as number,
      enrolmentId: packed.enrolmentIds[i] as number,
      value: numberOrNull(packed.values[i]),
      score: numberOrNull(packed.scores[i]),
      signal: SIGNALS[packed.signals[i] as number] ?? 'not-scored',
    };
  }
}
