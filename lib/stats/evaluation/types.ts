import type { AlgorithmAIteration } from '../location-scale/algorithm-a';
import type { StartScaleSource } from '../location-scale/algorithm-a-start';
import type { CensoredJudgement } from '../scores/judge-censored';
import type { UncertaintyClass } from '../scores/classify-uncertainty';
import type { Signal } from '../scores/limits';
import type { WorkingStep } from '../working';

/** One figure of one participant, in the unit of the plan. */
export interface MeasurandResult {
  readonly participant: string;
  readonly value: number;
  readonly standardUncertainty: number | null;
  /** U(x_i) as the participant stated it, for E_n; without it, 2 u(x_i) is taken. */
  readonly expandedUncertainty?: number | null;
}

export interface CensoredResult {
  readonly participant: string;
  readonly comparator: '<' | '>';
  readonly limit: number;
}

export type AssignedValueMethod = 'algorithm-a' | 'median' | 'mean' | 'stated';

export interface AssignedValueSetting {
  readonly method: AssignedValueMethod;
  /** For 'stated': from formulation, a certified reference material, a reference or expert laboratories. */
  readonly value?: number;
  readonly standardUncertainty?: number;
}

export type SigmaPtRule = 'prescribed' | 'percent' | 'horwitz' | 'horwitz-thompson' | 'robust-sd';

export interface SigmaPtSetting {
  readonly rule: SigmaPtRule;
  readonly value?: number;
  readonly percent?: number;
  /** Mass fraction (g/g) of one unit of the results, for Horwitz and HorRat; 1e-9 for micrograms per kilogram. */
  readonly massFractionPerUnit?: number;
}

export type JudgedScore = 'z' | 'z-prime' | 'zeta' | 'e-n';

export interface ScoreSetting {
  readonly kind: JudgedScore;
  /** With kind 'z': judge by z' when u(x_pt) > 0.3 sigma_pt. */
  readonly zPrimeWhenNeeded: boolean;
}

export interface EvaluateMeasurandInput {
  readonly results: readonly MeasurandResult[];
  readonly censored: readonly CensoredResult[];
  /** Participants who are scored but take no part in the consensus and in the round's own statistics. */
  readonly excluded?: readonly string[];
  readonly assignedValue: AssignedValueSetting;
  readonly sigmaPt: SigmaPtSetting;
  readonly score: ScoreSetting;
}

export interface EvaluateOptions {
  readonly working?: boolean;
}

export interface AssignedValue {
  readonly value: number | null;
  readonly standardUncertainty: number | null;
  readonly method: AssignedValueMethod;
  /** How many results made it; 0 for a stated value. */
  readonly count: number;
  /** Why the value or its uncertainty is missing. */
  readonly reason: string | null;
}

export interface AlgorithmASummary {
  readonly location: number;
  readonly scale: number;
  readonly iterations: number;
  readonly converged: boolean;
  readonly startLocation: number;
  readonly startScale: number;
  readonly startScaleFrom: StartScaleSource;
  readonly zeroScale: boolean;
  readonly trace: readonly AlgorithmAIteration[] | null;
}

export type RobustName = 'median' | 'madE' | 'nIqr' | 'mean' | 'sd' | 'algorithmA';

/** The estimates side by side; a missing one is null and `reasons` says why. */
export interface RobustSummary {
  readonly count: number;
  readonly median: number | null;
  readonly madE: number | null;
  readonly nIqr: number | null;
  readonly mean: number | null;
  readonly sd: number | null;
  readonly algorithmA: AlgorithmASummary | null;
  readonly reasons: Readonly<Partial<Record<RobustName, string>>>;
}

export interface SigmaPtValue {
  readonly value: number | null;
  readonly rule: SigmaPtRule;
  readonly horRat: number | null;
  readonly reason: string | null;
  /** Why there is no HorRat. */
  readonly horRatReason: string | null;
}

export interface NegligibleUncertainty {
  readonly ratio: number | null;
  readonly limit: number;
  readonly negligible: boolean | null;
  readonly reason: string | null;
}

export interface ParticipantScore {
  readonly participant: string;
  readonly value: number;
  readonly standardUncertainty: number | null;
  /** U(x_i) in E_n: as stated, or the coverage factor times u(x_i). */
  readonly expandedUncertainty: number | null;
  readonly excluded: boolean;
  readonly D: number | null;
  readonly dPercent: number | null;
  readonly z: number | null;
  readonly zPrime: number | null;
  readonly zeta: number | null;
  readonly eN: number | null;
  /** The score that is judged: the one named by `scoreKind`. */
  readonly score: number | null;
  readonly signal: Signal | null;
  readonly uncertaintyClass: UncertaintyClass | null;
  /** Why there is no judged score. */
  readonly reason: string | null;
}

export interface CensoredScore {
  readonly participant: string;
  readonly comparator: '<' | '>';
  readonly limit: number;
  readonly excluded: boolean;
  readonly judgement: CensoredJudgement | null;
  readonly reason: string | null;
}

export interface EvaluationCounts {
  /** Participants with a judged score. */
  readonly scored: number;
  /** Numeric results that made the round's own statistics. */
  readonly used: number;
  readonly censoredLow: number;
  readonly censoredHigh: number;
  /** Numeric results left out of the consensus by name. */
  readonly excluded: number;
}

/** Everything in it survives JSON: no NaN, no Infinity; what is missing is null and has a reason. */
export interface MeasurandEvaluation {
  readonly libraryVersion: string;
  readonly assigned: AssignedValue;
  readonly robust: RobustSummary;
  readonly sigmaPt: SigmaPtValue;
  readonly negligibleUncertainty: NegligibleUncertainty;
  readonly scoreKind: JudgedScore;
  readonly scoreKindReason: string;
  /** Coverage factor of U(x_pt) in E_n, and of U(x_i) where a participant stated none. */
  readonly coverageFactor: number;
  readonly scores: readonly ParticipantScore[];
  readonly censored: readonly CensoredScore[];
  readonly counts: EvaluationCounts;
  readonly notes: readonly string[];
  /** The steps, when they were asked for. */
  readonly working: readonly WorkingStep[] | null;
}
