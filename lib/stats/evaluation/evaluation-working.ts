import { CLAUSES } from '../clauses';
import { CONSENSUS_FACTOR } from '../consensus/consensus-uncertainty';
import type { WorkingStep } from '../working';
import { scaleBesideMedian } from './assign-value';
import { estimateSteps } from './estimate-steps';
import type {
  AssignedValue,
  MeasurandEvaluation,
  EvaluateMeasurandInput,
  NegligibleUncertainty,
  RobustSummary,
  SigmaPtValue,
} from './types';

interface WorkingFacts {
  readonly assigned: AssignedValue;
  readonly robust: RobustSummary;
  readonly sigmaPt: SigmaPtValue;
  readonly negligibleUncertainty: NegligibleUncertainty;
}

/** The steps from the results to x_pt, u(x_pt) and sigma_pt; participantWorking goes on from there. */
export function evaluationWorking(
  input: EvaluateMeasurandInput,
  sorted: readonly number[],
  facts: WorkingFacts,
): NonNullable<MeasurandEvaluation['working']> {
  const steps: (WorkingStep | null)[] = [
    ...estimateSteps(sorted, facts.robust),
    assignedStep(facts),
    uncertaintyStep(facts),
    sigmaStep(input, facts),
    negligibleStep(facts),
  ];
  return steps.filter((step) => step !== null);
}

function assignedStep({ assigned }: WorkingFacts): WorkingStep | null {
  if (assigned.value === null) return null;
  const { method, value } = assigned;
  const words = {
    'algorithm-a': 'robust_mean',
    median: 'median',
    mean: 'mean',
    stated: 'stated_value',
  } as const;
  const clauses = {
    'algorithm-a': CLAUSES.algorithmA,
    median: CLAUSES.median,
    mean: CLAUSES.mean,
    stated: CLAUSES.statedValue,
  } as const;
  const source = words[method];
  return {
    name: 'Assigned value x_pt',
    formula: `x_pt = ${source}`,
    clause: clauses[method],
    inputs: { [source]: value },
    value,
  };
}

function uncertaintyStep({ assigned, robust }: WorkingFacts): WorkingStep | null {
  const { standardUncertainty: value, method, count } = assigned;
  if (value === null) return null;
  const name = 'Standard uncertainty u(x_pt)';
  if (method === 'stated') {
    const inputs = { stated_uncertainty: value };
    return { name, formula: 'u_x_pt = stated_uncertainty', clause: CLAUSES.statedValue, inputs, value };
  }
  if (method === 'mean') {
    const inputs = { sd: robust.sd, p: count };
    return { name, formula: 'u_x_pt = sd / sqrt(p)', clause: CLAUSES.meanUncertainty, inputs, value };
  }
  const beside = scaleBesideMedian(robust);
  const scale = method === 'median' ? beside.name : 's_star';
  const inputs = {
    [scale]: method === 'median' ? beside.scale : (robust.algorithmA?.scale ?? null),
    p: count,
  };
  const formula = `u_x_pt = ${CONSENSUS_FACTOR} * ${scale} / sqrt(p)`;
  return { name, formula, clause: CLAUSES.consensusUncertainty, inputs, value };
}

function sigmaStep(
  { sigmaPt: setting }: EvaluateMeasurandInput,
  { sigmaPt, assigned, robust }: WorkingFacts,
): WorkingStep | null {
  const { value, rule } = sigmaPt;
  if (value === null) return null;
  const name = 'Standard deviation for proficiency assessment sigma_pt';
  const x_pt = assigned.value;
  const unit = setting.massFractionPerUnit ?? null;
  if (rule === 'prescribed') {
    const inputs = { prescribed_value: value };
    return { name, formula: 'sigma_pt = prescribed_value', clause: CLAUSES.prescribed, inputs, value };
  }
  if (rule === 'percent') {
    const inputs = { x_pt, percent: setting.percent ?? null };
    return {
      name,
      formula: 'sigma_pt = abs(x_pt) * percent / 100',
      clause: CLAUSES.prescribed,
      inputs,
      value,
    };
  }
  if (rule === 'robust-sd') {
    const inputs = { s_star: robust.algorithmA?.scale ?? null };
    return { name, formula: 'sigma_pt = s_star', clause: CLAUSES.robustSd, inputs, value };
  }
  const clause = rule === 'horwitz' ? CLAUSES.horwitz : CLAUSES.horwitzThompson;
  const formula = horwitzFormula(rule, (x_pt ?? 0) * (unit ?? 0));
  return { name, formula, clause, inputs: { x_pt, mass_fraction_of_unit: unit }, value };
}

/** The branch that was taken, written out in the unit of the results. */
function horwitzFormula(rule: 'horwitz' | 'horwitz-thompson', fraction: number): string {
  if (rule === 'horwitz-thompson' && fraction < 1.2e-7) return 'sigma_pt = 0.22 * x_pt';
  if (rule === 'horwitz-thompson' && fraction > 0.138) {
    return 'sigma_pt = 0.01 * (x_pt * mass_fraction_of_unit)^0.5 / mass_fraction_of_unit';
  }
  return 'sigma_pt = 0.02 * (x_pt * mass_fraction_of_unit)^0.8495 / mass_fraction_of_unit';
}

function negligibleStep({ assigned, sigmaPt, negligibleUncertainty }: WorkingFacts): WorkingStep | null {
  if (negligibleUncertainty.ratio === null) return null;
  return {
    name: 'Is u(x_pt) at most 0.3 sigma_pt',
    formula: 'ratio = u_x_pt / sigma_pt',
    clause: CLAUSES.negligible,
    inputs: { u_x_pt: assigned.standardUncertainty, sigma_pt: sigmaPt.value },
    value: negligibleUncertainty.ratio,
  };
}
