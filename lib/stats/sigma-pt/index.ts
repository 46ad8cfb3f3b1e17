export * from './hor-rat';
export * from './horwitz-sigma';
export * from './horwitz-thompson-sigma';
export * from './percent-sigma';
export * from './prescribed-sigma';
export * from './robust-sigma';
