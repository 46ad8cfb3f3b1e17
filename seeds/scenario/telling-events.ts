import type { EnrolmentState } from '@/db/enrolment-store';
import {
  aboveRange,
  multiplied,
  notMeasured,
  sameReplicates,
  swapped,
  unitOfThePlan,
  withoutDilution,
  type Change,
} from './changes';

interface Event {
  laboratory: string;
  round: string;
}

export const SLIPS: readonly (Event & { change: Change })[] = [
  { laboratory: 'Tolvers Quay Terminal', round: 'cereals-round-5', change: swapped('M1', 'M2') },
  { laboratory: 'Marrick Vale Feeds', round: 'cereals-round-5', change: swapped('M1', 'M2') },
  { laboratory: 'Ashlode Staithe Terminal', round: 'cereals-round-5', change: aboveRange('M1', 'FUM', 5000) },
  { laboratory: 'Oxmere Mill', round: 'cereals-round-6', change: unitOfThePlan('M1', 'FUM') },
  { laboratory: 'Saltby Fold Feeds', round: 'cereals-round-6', change: sameReplicates },
  { laboratory: 'Brackwater Feeds', round: 'feed-round-6', change: withoutDilution('F1', 'AFB1') },
  {
    laboratory: 'Kettlesing Flour',
    round: 'feed-round-6',
    change: notMeasured('F1', 'ZEN', 'Plate reader out of service, not measured'),
  },
  { laboratory: 'Saltby Fold Feeds', round: 'feed-round-7', change: sameReplicates },
  { laboratory: 'Wendle Roller Mill', round: 'feed-round-7', change: withoutDilution('F1', 'AFB1') },
  { laboratory: 'Birchlow Testing', round: 'feed-round-7', change: unitOfThePlan('F1', 'DON') },
  { laboratory: 'Orrowby Premix', round: 'feed-round-7', change: swapped('F1', 'F2') },
];

/** Files that were sent and then replaced: what was wrong with each, in the order in which they were sent. */
export const AMENDMENTS: readonly (Event & { mistakes: readonly Change[] })[] = [
  {
    laboratory: 'Nether Wyle Mill',
    round: 'cereals-round-6',
    mistakes: [multiplied('W1', 'DON', 10), multiplied('W1', 'ZEN', 0.5)],
  },
  {
    laboratory: 'Highmarch Public Analyst',
    round: 'feed-round-5',
    mistakes: [multiplied('P1', 'AFM1', 1000)],
  },
  { laboratory: 'Sevenoar Laboratories', round: 'feed-round-7', mistakes: [multiplied('F2', 'ZEN', 0.1)] },
  {
    laboratory: 'Lirrow Basin Public Laboratory',
    round: 'cereals-round-8',
    mistakes: [multiplied('W1', 'DON', 10)],
  },
];

export interface Fate {
  state: Exclude<EnrolmentState, 'enrolled'>;
  reason: string;
  /** Withdrawn after its file had come in; the file is kept and does not count. */
  hadSent: boolean;
}

export const FATES: readonly (Event & Fate)[] = [
  {
    laboratory: 'Eastrow Maltings',
    round: 'feed-round-5',
    state: 'withdrawn',
    reason: 'Flood in the laboratory; the calibration cannot be shown to have held.',
    hadSent: true,
  },
  {
    laboratory: 'Vannet Creamery',
    round: 'cereals-round-6',
    state: 'declined',
    reason: 'No maize tested this season.',
    hadSent: false,
  },
  {
    laboratory: 'Quarrow Milk Drying',
    round: 'cereals-round-8',
    state: 'invited',
    reason: '',
    hadSent: false,
  },
  { laboratory: 'Three Fords Dairy', round: 'cereals-round-8', state: 'invited', reason: '', hadSent: false },
];

/** Enrolled in every round; nothing has ever come. */
export const NEVER_SENDS: readonly string[] = ['Garth Hill Grain Store'];

/** Still measuring in the open round: their tokens are given out so that a first upload can be tried. */
export const TOKEN_HOLDERS: readonly string[] = ['Hollin Staithe Terminal', 'Saltings Border Laboratory'];

/** Sends from its own system with a token. */
export const SENDS_BY_TOKEN = 'Orrowby Premix';

export function slipsOf(laboratory: string, round: string): Change[] {
  return SLIPS.filter((slip) => slip.laboratory === laboratory && slip.round === round).map(
    ({ change }) => change,
  );
}

export function mistakesOf(laboratory: string, round: string): readonly Change[] {
  return AMENDMENTS.find((entry) => entry.laboratory === laboratory && entry.round === round)?.mistakes ?? [];
}

export function fateOf(laboratory: string, round: string): Fate | null {
  return FATES.find((entry) => entry.laboratory === laboratory && entry.round === round) ?? null;
}
