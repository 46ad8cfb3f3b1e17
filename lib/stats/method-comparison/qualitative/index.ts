export * from './decision-agreement';
export * from './detection-limits';
export * from './kappa';
export * from './laboratory-pod';
export * from './mc-nemar';
export * from './probability-of-detection';
export { proportionDifference, type Proportion, type ProportionDifference } from './proportion-difference';
export * from './proportion-interval';
