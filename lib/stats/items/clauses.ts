/** Where the formulas of this topic stand; clause numbers of ISO 13528 (2022) are given from memory. */
export const ITEM_CLAUSES = {
  homogeneity: 'ISO 13528:2022, Annex B.3',
  criterion: 'ISO 13528:2022, Annex B.2',
  expanded: 'ISO 13528:2022, Annex B.2; Fearn and Thompson 2001, Analyst 126, 1414',
  cochran: 'ISO 13528:2022, Annex B.2; ISO 5725-2:2019, 7.3.3',
  repeatability: 'ISO 13528:2022, 6.1; IUPAC 2006, Appendix 1',
  trend: 'ISO Guide 35:2017, 7 (trend over the filling order)',
  failed: 'ISO 13528:2022, Annex B.2 (what may be done)',
  stability: 'ISO 13528:2022, Annex B.5',
  stabilityTrend: 'ISO Guide 35:2017, 8 (test of the slope)',
} as const;
