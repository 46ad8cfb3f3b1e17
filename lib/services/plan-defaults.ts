import 'server-only';
import type { Measurand } from '@/db/measurand-store';
import type { RoundMeasurandPlan } from '@/db/round-measurand-store';

/** How a measurand is evaluated in a round until someone plans it otherwise: robust consensus, sigma_pt as the scheme has it. */
export function defaultPlan(measurand: Measurand): RoundMeasurandPlan {
  return {
    replicates: 1,
    assignedMethod: 'algorithm-a',
    statedValue: null,
    statedUncertainty: null,
    statedSource: null,
    sigmaRule: measurand.sigmaRule,
    sigmaValue: measurand.sigmaValue,
    sigmaPercent: measurand.sigmaPercent,
    scoreKind: 'z',
    zPrimeWhenNeeded: true,
  };
}
