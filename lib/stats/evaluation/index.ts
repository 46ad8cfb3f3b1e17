export * from './evaluate-measurand';
export * from './participant-working';
export type * from './types';
