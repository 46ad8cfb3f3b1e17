export * from './format-statistic';
