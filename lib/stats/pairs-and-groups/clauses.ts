/** Where the formulas of this topic stand; clause numbers of ISO 13528 (2022) are given from memory. */
export const PAIR_CLAUSES = {
  youden: 'ISO 13528:2022, 10.5; Youden 1959, Industrial Quality Control 15, 24',
  ellipse: 'Mandel and Lashof 1974, Journal of Quality Technology 6, 22',
  repeatability: 'ISO 13528:2022, 10.6; van Nuland 1992, Quality Engineering 4, 583',
  groups: 'ISO 13528:2022, 10.3 (sub-populations); Welch 1947, Biometrika 34, 28',
} as const;
