import type { RoundState } from '@/db/round-store';
import type { MeasurandCode } from './methods';
import type { PlannedItem } from './items';
import { BARLEY, FEED_HIGH, FEED_LOW, MAIZE_HIGH, MAIZE_LOW, MILK_POWDER, WHEAT } from './items';
import type { RoundMeasurandPlan } from '@/db/round-measurand-store';
import type { SchemeKey } from './schemes';

export interface DemoRound {
  /** Also the address of the round. */
  slug: string;
  scheme: SchemeKey;
  name: string;
  state: Exclude<RoundState, 'cancelled'>;
  /** The day it closes, counted from the day of seeding. */
  closes: number;
  items: readonly PlannedItem[];
  replicates: number;
  /** Levels that the story needs, by `item measurand`; all others are drawn. */
  levels: Readonly<Record<string, number>>;
  /** Choices that differ from those of the scheme, by measurand. */
  choices: Readonly<Partial<Record<MeasurandCode, Partial<RoundMeasurandPlan>>>>;
  coordinator: 0 | 1;
  reviewer: 0 | 1;
}

const PUBLISHED = 12;
const FIRST_CLOSE = -1130;
const LAST_PUBLISHED_CLOSE = -100;

type Later = [state: DemoRound['state'], closes: number];

/** After the published ones: one to be signed, one to be reviewed, one open, one being planned. */
const LATER: readonly Later[] = [
  ['evaluated', -24],
  ['closed', -2],
  ['open', 10],
  ['draft', 95],
];

type Telling = Partial<Pick<DemoRound, 'replicates' | 'levels' | 'choices'>>;

const TELLING: Readonly<Record<string, Telling>> = {
  'feed-round-1': { choices: { OTA: { sigmaRule: 'robust-sd' } } },
  'cereals-round-2': { choices: { OTA: { assignedMethod: 'median' } } },
  'feed-round-2': { choices: { AFM1: { assignedMethod: 'median', scoreKind: 'z-prime' } } },
  'cereals-round-3': {
    choices: { ZEN: { sigmaRule: 'prescribed', sigmaValue: 22, sigmaPercent: null } },
  },
  'feed-round-3': {
    levels: { 'P1 AFM1': 0.25 },
    choices: {
      AFM1: {
        assignedMethod: 'stated',
        statedValue: 0.25,
        statedUncertainty: 0.006,
        statedSource: 'Formulation: blank milk powder with a weighed addition, by the provider (invented)',
      },
    },
  },
  'feed-round-4': {
    levels: { 'P1 AFM1': 0.36 },
    choices: {
      AFM1: {
        assignedMethod: 'stated',
        statedValue: 0.36,
        statedUncertainty: 0.015,
        statedSource: 'One reference laboratory, isotope dilution in six vials (invented)',
        scoreKind: 'zeta',
      },
    },
  },
  'cereals-round-5': { levels: { 'M1 AFB1': 9.4, 'M2 AFB1': 2.1, 'M1 FUM': 7200, 'M2 FUM': 820 } },
  'cereals-round-6': { replicates: 2, levels: { 'M1 FUM': 2350 } },
  'feed-round-6': { levels: { 'F1 AFB1': 13.2 } },
  'feed-round-7': { replicates: 2, levels: { 'F1 AFB1': 11.6, 'F1 DON': 1650 } },
};

function itemsOf(scheme: SchemeKey, number: number): readonly PlannedItem[] {
  const isOdd = number % 2 === 1;
  if (scheme === 'cereals') return isOdd ? [MAIZE_HIGH, MAIZE_LOW, WHEAT] : [MAIZE_HIGH, WHEAT, BARLEY];
  return isOdd ? [FEED_HIGH, FEED_LOW, MILK_POWDER] : [FEED_HIGH, MILK_POWDER];
}

function publishedClose(index: number): number {
  return Math.round(FIRST_CLOSE + (index * (LAST_PUBLISHED_CLOSE - FIRST_CLOSE)) / (PUBLISHED - 1));
}

function roundAt(index: number): DemoRound {
  const scheme = index % 2 === 0 ? 'cereals' : 'feed';
  const number = Math.floor(index / 2) + 1;
  const slug = `${scheme}-round-${number}`;
  const later = LATER[index - PUBLISHED];
  return {
    slug,
    scheme,
    name: `${scheme === 'cereals' ? 'Cereals' : 'Feed'} round ${number}`,
    state: later?.[0] ?? 'published',
    closes: later?.[1] ?? publishedClose(index),
    items: itemsOf(scheme, number),
    replicates: 1,
    levels: {},
    choices: {},
    coordinator: index % 2 === 0 ? 0 : 1,
    reviewer: index % 3 === 0 ? 1 : 0,
    ...TELLING[slug],
  };
}

/** All rounds from the oldest to the one still being planned. */
export const ROUNDS: readonly DemoRound[] = Array.from({ length: PUBLISHED + LATER.length }, (_, index) =>
  roundAt(index),
);
