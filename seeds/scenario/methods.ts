/** Techniques by the code that laboratories write into the column method. */
export type Technique = 'IAF' | 'ELISA' | 'LFR' | 'LC-FLD' | 'LC-MSMS';

export type MeasurandCode = 'AFB1' | 'AFT' | 'FUM' | 'DON' | 'ZEN' | 'OTA' | 'AFM1';

interface Method {
  name: string;
  /** Share of the level by which the technique reads high or low. */
  bias: number;
  /** Scatter as a share of the scatter that the Horwitz-Thompson function gives. */
  spread: number;
  /** Relative expanded uncertainty (k = 2) as a share of twice the Horwitz-Thompson scatter. */
  statedUncertainty: number;
  /** Limits of quantification, ug/kg. */
  loq: Record<MeasurandCode, number>;
}

/** Biases, scatters and limits are invented, of the size that such methods have. */
export const METHODS: Record<Technique, Method> = {
  IAF: {
    name: 'immunoaffinity column and fluorometer (rapid)',
    bias: 0.1,
    spread: 0.8,
    statedUncertainty: 0.8,
    loq: { AFB1: 1, AFT: 1, FUM: 250, DON: 150, ZEN: 20, OTA: 1, AFM1: 0.05 },
  },
  ELISA: {
    name: 'ELISA plate',
    bias: 0.02,
    spread: 1,
    statedUncertainty: 0.9,
    loq: { AFB1: 1.7, AFT: 1.7, FUM: 200, DON: 200, ZEN: 25, OTA: 1.9, AFM1: 0.05 },
  },
  LFR: {
    name: 'lateral flow reader (rapid)',
    bias: -0.03,
    spread: 1.1,
    statedUncertainty: 1,
    loq: { AFB1: 4, AFT: 4, FUM: 300, DON: 250, ZEN: 40, OTA: 2.5, AFM1: 0.15 },
  },
  'LC-FLD': {
    name: 'liquid chromatography with fluorescence detection',
    bias: 0,
    spread: 0.7,
    statedUncertainty: 0.65,
    loq: { AFB1: 0.2, AFT: 0.4, FUM: 40, DON: 50, ZEN: 5, OTA: 0.3, AFM1: 0.01 },
  },
  'LC-MSMS': {
    name: 'liquid chromatography with tandem mass spectrometry',
    bias: -0.01,
    spread: 0.65,
    statedUncertainty: 0.6,
    loq: { AFB1: 0.1, AFT: 0.3, FUM: 25, DON: 20, ZEN: 3, OTA: 0.2, AFM1: 0.01 },
  },
};
