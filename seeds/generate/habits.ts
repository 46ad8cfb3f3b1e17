import type { Separator } from '@/lib/results-file';
import type { DemoLaboratory } from '../scenario/laboratories';
import { METHODS } from '../scenario/methods';
import { HABITS_OF } from '../scenario/telling-habits';
import { streamFor } from '../story/random';

/** How a laboratory works and writes, the same in every round. */
export interface Habits {
  /** Lasting bias, in units of the Horwitz-Thompson scatter. */
  bias: number;
  /** Scatter from round to round and item to item, on the same scale. */
  spread: number;
  hasHeavyTails: boolean;
  /** z added in round number n of the story, for a laboratory that drifts. */
  drift: (index: number) => number;
  /** Relative expanded uncertainty; null leaves the size to the method. */
  statedUncertainty: number | null;
  statesUncertainty: boolean;
  statesLoq: boolean;
  writesMgPerKg: boolean;
  separator: Separator;
  decimalMark: '.' | ',';
  hasByteOrderMark: boolean;
}

/** Shares of laboratories and sizes of scatter, chosen so that most z lie within 2. */
const BIAS = 0.6;
const SPREAD = 0.8;
const WITHOUT_UNCERTAINTY = 0.25;
const WITH_HEAVY_TAILS = 0.15;
const WITH_COMMA = 0.2;

export function habitsOf(laboratory: DemoLaboratory): Habits {
  const stream = streamFor('habits', laboratory.name);
  const { spread } = METHODS[laboratory.technique];
  const writesComma = stream.chance(WITH_COMMA);
  return {
    bias: BIAS * stream.normal(),
    spread: SPREAD * spread,
    hasHeavyTails: stream.chance(WITH_HEAVY_TAILS),
    drift: () => 0,
    statedUncertainty: null,
    statesUncertainty: !stream.chance(WITHOUT_UNCERTAINTY),
    statesLoq: stream.chance(0.7),
    writesMgPerKg: false,
    separator: writesComma ? stream.pick([';', ';', '\t']) : ',',
    decimalMark: writesComma ? ',' : '.',
    hasByteOrderMark: stream.chance(0.2),
    ...HABITS_OF[laboratory.name],
  };
}
