import { StatsError } from '../stats-error';
import { checkPositive } from './check-values';

export interface LevelInput {
  readonly assignedValue: number;
  readonly massFractionPerUnit: number;
}

/** The level as a mass fraction (g/g), checked to lie above 0 and not above 1. */
export function massFractionOf(caller: string, { assignedValue, massFractionPerUnit }: LevelInput): number {
  checkPositive(caller, 'mass fraction of one unit', massFractionPerUnit);
  checkPositive(caller, 'assigned value', assignedValue);
  const fraction = assignedValue * massFractionPerUnit;
  if (fraction > 1) {
    throw new StatsError(
      'out-of-domain',
      `${caller} requires a mass fraction of at most 1, found ${fraction}`,
    );
  }
  return fraction;
}
