export * from './consensus-uncertainty';
export * from './mean-uncertainty';
export * from './negligible-uncertainty';
