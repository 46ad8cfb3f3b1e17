export * from './one-way-anova';
export * from './pooled-sd';
export * from './precision';
export * from './precision-against-level';
export * from './precision-uncertainty-factors';
export * from './robust-precision';
