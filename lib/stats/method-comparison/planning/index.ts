export * from './power';
export * from './sample-size';
export * from './simulate-line-power';
export * from './simulate-power';
