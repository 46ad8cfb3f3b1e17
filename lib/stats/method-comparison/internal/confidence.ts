import { normalUpperQuantile, studentTUpperQuantile } from '../../distributions';
import { StatsError } from '../../stats-error';
import type { Interval } from '../types';

export const DEFAULT_CONFIDENCE = 0.95;

/** The confidence as given or the default; throws unless it lies between 0 and 1. */
export function confidenceOf(caller: string, confidence = DEFAULT_CONFIDENCE): number {
  if (!(confidence > 0 && confidence < 1)) {
    throw new StatsError(
      'out-of-domain',
      `${caller} requires a confidence between 0 and 1, found ${String(confidence)}`,
    );
  }
  return confidence;
}

/** Two-sided factor of Student's t. */
export function tFactor(confidence: number, degreesOfFreedom: number): number {
  return studentTUpperQuantile((1 - confidence) / 2, degreesOfFreedom);
}

/** Two-sided factor of the normal distribution. */
export function zFactor(confidence: number): number {
  return normalUpperQuantile((1 - confidence) / 2);
}

export function around(centre: number, halfWidth: number): Interval {
  return { lower: centre - halfWidth + 0, upper: centre + halfWidth + 0 };
}
