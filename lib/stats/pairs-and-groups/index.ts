export type { Ellipse, EllipseFactor } from './ellipse';
export * from './exchanged-items';
export * from './gross-error-screen';
export * from './method-groups';
export * from './repeatability-against-location';
export * from './youden-pair';
