export * from './cusum-linearity';
export * from './passing-bablok';
export * from './repeated-median';
export * from './theil-sen';
