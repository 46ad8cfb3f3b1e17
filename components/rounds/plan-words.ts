import { formatUnit } from '@/lib/format';
import { ASSIGNED_METHOD_NAMES, SCORE_KIND_NAMES } from '@/lib/schemas/rounds';
import { SIGMA_RULE_NAMES } from '@/lib/schemas/schemes';

export interface SigmaChoice {
  sigmaRule: keyof typeof SIGMA_RULE_NAMES;
  sigmaValue: number | null;
  sigmaPercent: number | null;
}

/** How sigma_pt is set, with its number. */
export function sigmaWords(choice: SigmaChoice, unit: string): string {
  if (choice.sigmaRule === 'prescribed') return `Prescribed: ${choice.sigmaValue} ${formatUnit(unit)}`;
  if (choice.sigmaRule === 'percent') return `${choice.sigmaPercent} % of the assigned value`;
  return SIGMA_RULE_NAMES[choice.sigmaRule];
}

export interface AssignedChoice {
  assignedMethod: keyof typeof ASSIGNED_METHOD_NAMES;
  statedValue: number | null;
  statedUncertainty: number | null;
}

export function assignedWords(choice: AssignedChoice, unit: string): string {
  if (choice.assignedMethod !== 'stated') return ASSIGNED_METHOD_NAMES[choice.assignedMethod];
  const u = choice.statedUncertainty === null ? '' : `, u = ${choice.statedUncertainty} ${formatUnit(unit)}`;
  return `Stated: ${choice.statedValue} ${formatUnit(unit)}${u}`;
}

export interface ScoreChoice {
  scoreKind: keyof typeof SCORE_KIND_NAMES;
  zPrimeWhenNeeded: boolean;
}

export function scoreWords({ scoreKind, zPrimeWhenNeeded }: ScoreChoice): string {
  if (scoreKind === 'z' && zPrimeWhenNeeded) return "z, or z' when u(x_pt) is above 0.3 sigma_pt";
  return SCORE_KIND_NAMES[scoreKind];
}
