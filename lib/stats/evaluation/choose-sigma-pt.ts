import { horRat } from '../sigma-pt/hor-rat';
import { horwitzSigma } from '../sigma-pt/horwitz-sigma';
import { horwitzThompsonSigma } from '../sigma-pt/horwitz-thompson-sigma';
import { percentSigma } from '../sigma-pt/percent-sigma';
import { prescribedSigma } from '../sigma-pt/prescribed-sigma';
import { attempt, missing, type Attempt } from './attempt';
import type { RobustSummary, SigmaPtSetting, SigmaPtValue } from './types';

/** sigma_pt by the rule of the plan, with HorRat beside it where the unit is a mass fraction. */
export function chooseSigmaPt(
  setting: SigmaPtSetting,
  assignedValue: number | null,
  robust: RobustSummary,
): SigmaPtValue {
  const sigma = sigmaByRule(setting, assignedValue, robust);
  const ratio = horRatOf(sigma.value, setting.massFractionPerUnit, assignedValue);
  return {
    value: sigma.value,
    rule: setting.rule,
    horRat: ratio.value,
    reason: sigma.reason,
    horRatReason: ratio.reason,
  };
}

function sigmaByRule(
  setting: SigmaPtSetting,
  assignedValue: number | null,
  robust: RobustSummary,
): Attempt<number> {
  const { rule, value, percent, massFractionPerUnit } = setting;
  if (rule === 'prescribed') {
    return value === undefined
      ? missing('the plan prescribes no sigma_pt')
      : attempt(() => prescribedSigma(value));
  }
  if (rule === 'robust-sd') return robustSdOf(robust);
  if (assignedValue === null) return missing('there is no assigned value to compute sigma_pt from');
  if (rule === 'percent') {
    if (percent === undefined) return missing('the plan gives no percentage for sigma_pt');
    return attempt(() => percentSigma({ assignedValue, percent }));
  }
  if (massFractionPerUnit === undefined)
    return missing('the unit is no mass fraction, so there is no Horwitz value');
  const level = { assignedValue, massFractionPerUnit };
  return attempt(() => (rule === 'horwitz' ? horwitzSigma(level) : horwitzThompsonSigma(level)));
}

function robustSdOf({ algorithmA, reasons }: RobustSummary): Attempt<number> {
  if (algorithmA === null)
    return missing(reasons.algorithmA ?? 'Algorithm A gave no robust standard deviation');
  if (algorithmA.scale > 0) return { value: algorithmA.scale, reason: null };
  return missing('the robust standard deviation of this round is 0, so nothing can be scored by it');
}

function horRatOf(
  sigma: number | null,
  massFractionPerUnit: number | undefined,
  assignedValue: number | null,
): Attempt<number> {
  if (sigma === null || assignedValue === null) return missing('HorRat needs sigma_pt and an assigned value');
  if (massFractionPerUnit === undefined) return missing('HorRat needs a unit that is a mass fraction');
  return attempt(() => horRat({ standardDeviation: sigma, assignedValue, massFractionPerUnit }));
}
