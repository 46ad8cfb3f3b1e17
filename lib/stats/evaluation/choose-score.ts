import { NEGLIGIBLE_SHARE, negligibleUncertainty } from '../consensus/negligible-uncertainty';
import { attempt } from './attempt';
import type { AssignedValue, JudgedScore, NegligibleUncertainty, ScoreSetting, SigmaPtValue } from './types';

export function checkNegligible(assigned: AssignedValue, sigmaPt: SigmaPtValue): NegligibleUncertainty {
  const limit = NEGLIGIBLE_SHARE;
  if (assigned.standardUncertainty === null || sigmaPt.value === null) {
    const reason = 'the check needs u(x_pt) and sigma_pt';
    return { ratio: null, limit, negligible: null, reason };
  }
  const input = { standardUncertainty: assigned.standardUncertainty, sigmaPt: sigmaPt.value };
  const found = attempt(() => negligibleUncertainty(input));
  if (found.reason !== null) return { ratio: null, limit, negligible: null, reason: found.reason };
  return { ...found.value, reason: null };
}

/** The score that is judged, and a sentence that says why. */
export function chooseScore(
  setting: ScoreSetting,
  check: NegligibleUncertainty,
): { scoreKind: JudgedScore; scoreKindReason: string } {
  if (setting.kind !== 'z')
    return { scoreKind: setting.kind, scoreKindReason: 'The plan asks for this score.' };
  if (check.negligible === true) {
    return { scoreKind: 'z', scoreKindReason: 'u(x_pt) is at most 0.3 sigma_pt, so z is used.' };
  }
  if (check.negligible === null) {
    return {
      scoreKind: 'z',
      scoreKindReason: 'The plan asks for z; u(x_pt) could not be checked against sigma_pt.',
    };
  }
  if (setting.zPrimeWhenNeeded) {
    return {
      scoreKind: 'z-prime',
      scoreKindReason: "u(x_pt) is above 0.3 sigma_pt, so z' is used instead of z.",
    };
  }
  return { scoreKind: 'z', scoreKindReason: 'The plan asks for z although u(x_pt) is above 0.3 sigma_pt.' };
}
