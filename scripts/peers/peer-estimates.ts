import {
  algorithmS,
  hinges,
  huberLocation,
  huberProposal2,
  qMethod,
  qn,
  sn,
  trimmedMean,
} from '../../lib/stats/location-scale';

/** The estimates under the names that estimators.R gives its own. */
export function peerEstimates(values: readonly number[]): Record<string, number> {
  const proposal2 = huberProposal2(values);
  const proposal1 = huberProposal2(values, { k: 1 });
  const { lower, upper } = hinges(values);
  return {
    qn: qn(values),
    qnRobustbase: qn(values),
    sn: sn(values),
    huberLocation: huberLocation(values).location,
    proposal2Location: proposal2.location,
    proposal2Scale: proposal2.scale,
    proposal1Location: proposal1.location,
    proposal1Scale: proposal1.scale,
    trimmed: trimmedMean(values, { share: 0.1 }).mean,
    qMethod: qMethod(values).scale,
    algorithmS: algorithmS(values.map(Math.abs), { degreesOfFreedom: 3 }).pooled,
    hingeLow: lower,
    hingeHigh: upper,
  };
}
