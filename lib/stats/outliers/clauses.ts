/** Where the tests of this topic stand; clause numbers of ISO 5725-2 (2019) are given from memory. */
export const OUTLIER_CLAUSES = {
  grubbsOne: 'ISO 5725-2:2019, 7.3.4 (one outlying observation)',
  grubbsTwo: 'ISO 5725-2:2019, 7.3.4 (two outlying observations)',
  grubbsOpposite: 'David, Hartley and Pearson 1954, Biometrika 41, 482',
  cochran: 'ISO 5725-2:2019, 7.3.3',
  dixon: 'Dixon 1951, Annals of Mathematical Statistics 22, 68',
  esd: 'Rosner 1983, Technometrics 25, 165',
  mandel: 'ISO 5725-2:2019, 7.3.1',
} as const;
