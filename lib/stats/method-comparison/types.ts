/** Lower and upper limit. -Infinity or Infinity means that the data give no limit on that side. */
export interface Interval {
  readonly lower: number;
  readonly upper: number;
}

export interface ConfidenceOptions {
  /** Two-sided confidence of the intervals. Default 0.95. */
  readonly confidence?: number;
}

/** Gives numbers from 0 up to, not including, 1, evenly spread; made from a seed by the caller. */
export type UniformGenerator = () => number;
