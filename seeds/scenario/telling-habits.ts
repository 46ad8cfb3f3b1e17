import type { Habits } from '../generate/habits';

/** The drift of z from -0.4 in the first round to the last, in even steps. */
const DRIFT_START = -0.4;
const DRIFT_STEP = 0.29;

const STEADY: Partial<Habits> = { bias: 0, spread: 0.25, hasHeavyTails: false, statesUncertainty: true };

/** Laboratories with a part in the story that lasts; one more table, of single events, is in telling-events.ts. */
export const HABITS_OF: Readonly<Record<string, Partial<Habits>>> = {
  'Selkey Lock Terminal': { ...STEADY, drift: (index) => DRIFT_START + DRIFT_STEP * index },
  'Brackwater Feeds': STEADY,
  'Oxmere Mill': { ...STEADY, writesMgPerKg: true },
  'Tolvers Quay Terminal': STEADY,
  'Marrick Vale Feeds': STEADY,
  'Wendle Roller Mill': STEADY,
  'Corrandale Analytical': { ...STEADY, statedUncertainty: 0.006 },
  'Pellow Dairy': { ...STEADY, statedUncertainty: 1.4 },
  'Dunmarrow Silo': { statesUncertainty: false },
  'Merewick Elevator': { hasHeavyTails: true },
  'Birchlow Testing': { writesMgPerKg: true },
};
