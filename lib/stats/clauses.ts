/**
 * Where each formula stands. Clause numbers are given from memory of ISO 13528 (2015, kept in 2022) and of the
 * IUPAC/ISO/AOAC Harmonized Protocol 2006; they are here once, so that a correction is made once.
 */
export const CLAUSES = {
  median: 'ISO 13528, Annex C.2.1',
  madE: 'ISO 13528, Annex C.2.2',
  nIqr: 'ISO 13528, Annex C.2.3',
  algorithmA: 'ISO 13528, Annex C.3.1',
  mean: 'ISO 5725-2, 7.4 (arithmetic mean)',
  statedValue: 'ISO 13528, 7.3 to 7.6',
  consensusUncertainty: 'ISO 13528, 7.7.3',
  meanUncertainty: 'standard uncertainty of a mean',
  negligible: 'ISO 13528, 9.2.1',
  prescribed: 'ISO 13528, 8.2',
  horwitz: 'ISO 13528, 8.4; Horwitz 1982',
  horwitzThompson: 'ISO 13528, 8.4; Thompson, Analyst 2000, 125, 385',
  robustSd: 'ISO 13528, 8.6',
  difference: 'ISO 13528, 9.3',
  z: 'ISO 13528, 9.4',
  zPrime: 'ISO 13528, 9.5',
  zeta: 'ISO 13528, 9.6',
  eN: 'ISO 13528, 9.7',
  uncertaintyClass: 'ISO 13528, 9.8',
} as const;
