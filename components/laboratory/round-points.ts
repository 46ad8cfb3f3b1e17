import type { ResultPoint, ScorePoint } from '@/components/charts/chart-types';
import type { DataColumn, DataRow } from '@/components/ui/data-table';
import type { MeasurandEvaluation } from '@/lib/stats';
import { censoredText, whyNotScored } from './own-score-row';
import { SCORE_NAMES } from './score-names';

/** Every numeric result of a round under its code, the own one marked. */
export function resultPoints(evaluation: MeasurandEvaluation, ownCode: string): ResultPoint[] {
  return evaluation.scores.map((entry) => ({
    code: entry.participant,
    value: entry.value,
    signal: entry.signal ?? 'not-scored',
    own: entry.participant === ownCode,
  }));
}

/** Every participant's judged score, those without one too: the chart counts what it leaves out. */
export function scorePoints(evaluation: MeasurandEvaluation, ownCode: string): ScorePoint[] {
  const scored: ScorePoint[] = evaluation.scores.map((entry) => ({
    code: entry.participant,
    score: entry.score,
    signal: entry.signal ?? 'not-scored',
    own: entry.participant === ownCode,
  }));
  const censored: ScorePoint[] = evaluation.censored.map(({ participant }) => ({
    code: participant,
    score: null,
    signal: 'not-scored',
    own: participant === ownCode,
  }));
  return [...scored, ...censored];
}

/** All codes with result and score, the own row marked; what a participant may know of the others. */
export function codesTable(
  evaluation: MeasurandEvaluation,
  { unit, decimals }: { unit: string; decimals: number },
  ownCode: string,
): { columns: DataColumn[]; rows: DataRow[]; sortBy: { key: string } } {
  const columns: DataColumn[] = [
    { key: 'code', label: 'Code', kind: 'text' },
    { key: 'result', label: `Result in ${unit}`, kind: 'number', decimals },
    { key: 'dPercent', label: 'D%', kind: 'number', decimals: 1 },
    {
      key: 'score',
      label: SCORE_NAMES[evaluation.scoreKind],
      kind: 'score',
      scoreKind: evaluation.scoreKind,
    },
  ];
  const scored: DataRow[] = evaluation.scores.map((entry) => ({
    id: entry.participant,
    own: entry.participant === ownCode,
    cells: {
      code: codeWords(entry.participant, ownCode),
      result: entry.value,
      dPercent: entry.dPercent,
      score: {
        score: entry.score,
        signal: entry.signal ?? 'not-scored',
        why: whyNotScored(entry, null),
      },
    },
  }));
  const censored: DataRow[] = evaluation.censored.map((entry) => ({
    id: entry.participant,
    own: entry.participant === ownCode,
    cells: {
      code: codeWords(entry.participant, ownCode),
      result: censoredText(entry, decimals),
      dPercent: null,
      score: { score: null, signal: 'not-scored', why: whyNotScored(null, entry) },
    },
  }));
  return { columns, rows: [...scored, ...censored], sortBy: { key: 'score' } };
}

function codeWords(code: string, ownCode: string): string {
  return code === ownCode ? `${code} (own)` : code;
}
