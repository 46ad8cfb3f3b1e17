export * from './beta';
export * from './binomial';
export * from './chi-square';
export * from './f';
export * from './noncentral-t';
export * from './normal';
export * from './student-t';
