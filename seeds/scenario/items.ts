import type { MeasurandCode } from './methods';

type Range = readonly [lowest: number, highest: number];

export interface PlannedItem {
  code: string;
  name: string;
  matrix: string;
  /** Measurands in the order of the scheme, each with the range its level is drawn from, ug/kg. */
  measurands: Readonly<Partial<Record<MeasurandCode, Range>>>;
}

export const HANDLING =
  'Keep closed, cool and dry; mix the whole portion before weighing. Mycotoxins are toxic and some are ' +
  'carcinogenic, dust carries them, and extraction solvents are flammable and toxic: follow the safety data sheet, ' +
  "your laboratory's own procedures and local rules. Not for food or feed use.";

export const INSTRUCTIONS =
  'Analyse each item as you would a routine sample and report on the unit of the plan. Give your expanded ' +
  'uncertainty and the limit of quantification where you have them. A score is not a verdict on safety: a decision ' +
  'on a lot follows the applicable regulation and your accredited procedure. This round and its figures are invented.';

export const MAIZE_HIGH: PlannedItem = {
  code: 'M1',
  name: 'Ground maize A',
  matrix: 'Maize, ground to 0.5 mm, 60 g',
  measurands: { AFB1: [6, 11], AFT: [7.7, 14], FUM: [1500, 3800] },
};

export const MAIZE_LOW: PlannedItem = {
  code: 'M2',
  name: 'Ground maize B',
  matrix: 'Maize, ground to 0.5 mm, 60 g',
  measurands: { AFB1: [1.6, 2.6], AFT: [2, 3.3], FUM: [600, 950] },
};

export const WHEAT: PlannedItem = {
  code: 'W1',
  name: 'Ground wheat',
  matrix: 'Wheat, ground to 0.5 mm, 60 g',
  measurands: { DON: [600, 1600], ZEN: [70, 140] },
};

export const BARLEY: PlannedItem = {
  code: 'B1',
  name: 'Ground barley',
  matrix: 'Barley, ground to 0.5 mm, 60 g',
  measurands: { OTA: [3.5, 7] },
};

export const FEED_HIGH: PlannedItem = {
  code: 'F1',
  name: 'Compound feed A',
  matrix: 'Feed for pigs, ground, 80 g',
  measurands: { AFB1: [8, 16], DON: [900, 2400], ZEN: [120, 300], OTA: [10, 30] },
};

export const FEED_LOW: PlannedItem = {
  code: 'F2',
  name: 'Compound feed B',
  matrix: 'Feed for dairy cows, ground, 80 g',
  measurands: { AFB1: [3, 5], DON: [450, 700], ZEN: [60, 95] },
};

export const MILK_POWDER: PlannedItem = {
  code: 'P1',
  name: 'Milk powder',
  matrix: 'Whole milk powder, 30 g',
  measurands: { AFM1: [0.2, 0.42] },
};
