/** Where the formulas of this topic stand; clause numbers of ISO 5725-2 (2019) and 5725-5 are given from memory. */
export const PRECISION_CLAUSES = {
  mean: 'ISO 5725-2:2019, 7.4',
  repeatability: 'ISO 5725-2:2019, 7.4 (repeatability variance)',
  between: 'ISO 5725-2:2019, 7.4 (between-laboratory variance)',
  reproducibility: 'ISO 5725-2:2019, 7.4 (reproducibility variance)',
  limits: 'ISO 5725-6, 4.1 (factor 2.8 = 1.96 sqrt(2))',
  horRat: 'Horwitz and Albert 2006, J. AOAC Int. 89, 1095',
  algorithmA: 'ISO 5725-5:1998, 6.2 (algorithm A)',
  algorithmS: 'ISO 5725-5:1998, 6.3 (algorithm S)',
} as const;
