export * from './homogeneity';
export * from './homogeneity-factors';
export type { HomogeneityRemedy, HomogeneityRemedyKind } from './homogeneity-remedies';
export * from './stability';
export * from './stability-trend';
