export * from './agreement';
export * from './lines';
export * from './planning';
export * from './qualitative';
export * from './rank-lines';
export type { ConfidenceOptions, Interval, UniformGenerator } from './types';
