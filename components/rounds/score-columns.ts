import type { DataColumn, DataRow } from '@/components/ui/data-table';
import { formatPlainNumber } from '@/lib/format';
import type {
  CensoredScore,
  JudgedScore,
  MeasurandEvaluation,
  ParticipantScore,
} from '@/lib/stats/evaluation/types';

export const SCORE_NAMES: Record<JudgedScore, string> = {
  z: 'z',
  'z-prime': "z'",
  zeta: 'zeta',
  'e-n': 'E_n',
};

const JUDGEMENT_WORDS = {
  consistent: 'consistent with the assigned value',
  inconsistent: 'not consistent with the assigned value',
  uninformative: 'tells nothing about the assigned value',
} as const;

/** Digits after the point for statistics of a measurand: two more than its results have. */
export function statisticDecimals(decimals: number): number {
  return decimals + 2;
}

const BINARY_ERROR = 1e-12;

/** A result with the plan's decimals, and up to two more where the laboratory reported more. */
export function resultText(value: number, decimals: number): string {
  for (let digits = decimals; digits < decimals + 2; digits += 1) {
    const text = formatPlainNumber(value, digits);
    // The mean of replicates carries an error of binary fractions: 10.370000000000001 is 10.37.
    if (Math.abs(Number(text) - value) <= BINARY_ERROR * Math.abs(value)) return text;
  }
  return formatPlainNumber(value, decimals + 2);
}

const OTHER_SCORES = [
  { kind: 'z', key: 'z', of: (entry: ParticipantScore) => entry.z },
  { kind: 'z-prime', key: 'zPrime', of: (entry: ParticipantScore) => entry.zPrime },
  { kind: 'zeta', key: 'zeta', of: (entry: ParticipantScore) => entry.zeta },
  { kind: 'e-n', key: 'eN', of: (entry: ParticipantScore) => entry.eN },
] as const;

/** The table of all codes: the judged score with its signal, and the other scores that could be had. */
export function scoreTable(
  evaluation: MeasurandEvaluation,
  plan: { unit: string; decimals: number },
  workingHref: ((code: string) => string) | null,
): { columns: DataColumn[]; rows: DataRow[] } {
  const { scoreKind, scores, censored } = evaluation;
  const others = OTHER_SCORES.filter(
    ({ kind, of }) => kind !== scoreKind && scores.some((entry) => of(entry) !== null),
  );
  const hasUncertainty = scores.some((entry) => entry.standardUncertainty !== null);
  const digits = statisticDecimals(plan.decimals);
  const columns: DataColumn[] = [
    { key: 'code', label: 'Code', kind: workingHref ? 'link' : 'text' },
    { key: 'result', label: `Result (${plan.unit})`, kind: 'number', decimals: plan.decimals },
    ...(hasUncertainty
      ? [{ key: 'u', label: `u(x) (${plan.unit})`, kind: 'number' as const, decimals: digits }]
      : []),
    { key: 'D', label: `D (${plan.unit})`, kind: 'number', decimals: digits },
    { key: 'dPercent', label: 'D%', kind: 'number', decimals: 1 },
    { key: 'score', label: SCORE_NAMES[scoreKind], kind: 'score', scoreKind },
    ...others.map(({ kind, key }) => ({
      key,
      label: SCORE_NAMES[kind],
      kind: 'number' as const,
      decimals: 2,
    })),
    { key: 'note', label: 'Note', kind: 'text' },
  ];
  const codeCell = (code: string) => (workingHref ? { text: code, href: workingHref(code) } : code);
  const scoredRow = (entry: ParticipantScore): DataRow => ({
    id: entry.participant,
    cells: {
      code: codeCell(entry.participant),
      result: resultText(entry.value, plan.decimals),
      u: entry.standardUncertainty,
      D: entry.D,
      dPercent: entry.dPercent,
      score: { score: entry.score, signal: entry.signal ?? 'not-scored', why: entry.reason ?? undefined },
      ...Object.fromEntries(others.map(({ key, of }) => [key, of(entry)])),
      note: scoreNote(entry),
    },
  });
  return { columns, rows: [...scores.map(scoredRow), ...censored.map(censoredRow(codeCell, plan.decimals))] };
}

function scoreNote(entry: ParticipantScore): string {
  const notes: string[] = [];
  if (entry.excluded) notes.push('left out of the consensus');
  if (entry.uncertaintyClass === 'low') notes.push('stated uncertainty looks low');
  if (entry.uncertaintyClass === 'high') notes.push('stated uncertainty looks high');
  if (entry.reason) notes.push(entry.reason);
  return notes.join('; ');
}

function censoredRow(
  codeCell: (code: string) => DataRow['cells'][string],
  decimals: number,
): (entry: CensoredScore) => DataRow {
  return (entry) => ({
    id: entry.participant,
    cells: {
      code: codeCell(entry.participant),
      result: `${entry.comparator}${resultText(entry.limit, decimals)}`,
      score: { score: null, signal: 'not-scored', why: 'not a number' },
      note: entry.judgement ? JUDGEMENT_WORDS[entry.judgement] : (entry.reason ?? ''),
    },
  });
}
