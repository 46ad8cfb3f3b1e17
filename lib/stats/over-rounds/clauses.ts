/** Where the formulas of this topic stand; clause numbers of ISO 13528 (2022) are given from memory. */
export const ROUND_CLAUSES = {
  shewhart: 'ISO 13528:2022, 10.8 (control chart of z); ISO 7870-2:2013',
  cusum: 'ISO 13528:2022, 10.8; ISO 7870-4:2021; Page 1954, Biometrika 41, 100',
  ewma: 'ISO 7870-6:2016; NIST/SEMATECH e-Handbook 6.3.2.4',
  median: 'common practice, no source',
  summary: 'ISO 13528:2022, 10.8 (bias and spread over rounds)',
  relation: 'relation over rounds: least squares, Spearman 1904, Kruskal and Wallis 1952',
  uncertainty: 'ISO 13528:2022, 9.6 (zeta with z)',
} as const;
