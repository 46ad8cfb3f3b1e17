import type { SigmaRule } from '@/db/measurand-store';
import type { MeasurandCode } from './methods';

export type SchemeKey = 'cereals' | 'feed';

export interface MeasurandPlan {
  code: MeasurandCode;
  name: string;
  decimals: number;
  decisionLimit: number;
  decisionLimitSource: string;
  sigmaRule: SigmaRule;
  sigmaPercent: number | null;
}

interface SchemePlan {
  key: SchemeKey;
  name: string;
  description: string;
  measurands: readonly MeasurandPlan[];
}

export const UNIT = 'ug/kg';

const INVENTED =
  'This is a demonstration: the Lirrow basin, the Lirrow Basin Reference Office that runs the scheme, every ' +
  'laboratory, every person and every figure are invented. Decision limits are examples; the person in charge must ' +
  'confirm the limit that applies.';

function example(what: string): string {
  return `Example, from memory: ${what}. The person in charge must confirm the limit that applies.`;
}

const CEREAL_LIMITS = 'Regulation (EU) 2023/915';
const FEED_ADVICE = 'Recommendation 2006/576/EC, read 2024';
const TOTAL = 'Aflatoxins B1, B2, G1 and G2, sum';

/** sigma_pt by these rules is a choice of the invented provider, and common practice in its size. */
export const SCHEMES: readonly SchemePlan[] = [
  {
    key: 'cereals',
    name: 'Mycotoxins in cereals',
    description: `Maize, wheat and barley for the terminals, mills and laboratories of the Lirrow basin, two rounds a year. ${INVENTED}`,
    measurands: [
      {
        code: 'AFB1',
        name: 'Aflatoxin B1',
        decimals: 2,
        decisionLimit: 5,
        decisionLimitSource: example(`${CEREAL_LIMITS}, maize to be sorted, as of May 2023`),
        sigmaRule: 'horwitz-thompson',
        sigmaPercent: null,
      },
      {
        code: 'AFT',
        name: TOTAL,
        decimals: 2,
        decisionLimit: 10,
        decisionLimitSource: example(`${CEREAL_LIMITS}, maize to be sorted, as of May 2023`),
        sigmaRule: 'horwitz-thompson',
        sigmaPercent: null,
      },
      {
        code: 'FUM',
        name: 'Fumonisins B1 and B2, sum',
        decimals: 0,
        decisionLimit: 4000,
        decisionLimitSource: example(`${CEREAL_LIMITS}, unprocessed maize, as of May 2023`),
        sigmaRule: 'percent',
        sigmaPercent: 20,
      },
      {
        code: 'DON',
        name: 'Deoxynivalenol',
        decimals: 0,
        decisionLimit: 1000,
        decisionLimitSource: example(`${CEREAL_LIMITS}, unprocessed wheat, as amended for July 2024`),
        sigmaRule: 'horwitz',
        sigmaPercent: null,
      },
      {
        code: 'ZEN',
        name: 'Zearalenone',
        decimals: 1,
        decisionLimit: 100,
        decisionLimitSource: example(`${CEREAL_LIMITS}, unprocessed wheat, as of May 2023`),
        sigmaRule: 'percent',
        sigmaPercent: 25,
      },
      {
        code: 'OTA',
        name: 'Ochratoxin A',
        decimals: 2,
        decisionLimit: 5,
        decisionLimitSource: example(`${CEREAL_LIMITS}, unprocessed cereals, as of May 2023`),
        sigmaRule: 'horwitz-thompson',
        sigmaPercent: null,
      },
    ],
  },
  {
    key: 'feed',
    name: 'Mycotoxins in feed and milk powder',
    description: `Compound feed for the feed makers and milk powder for the dairies of the Lirrow basin, two rounds a year. ${INVENTED}`,
    measurands: [
      {
        code: 'AFB1',
        name: 'Aflatoxin B1',
        decimals: 2,
        decisionLimit: 20,
        decisionLimitSource: example('Directive 2002/32/EC, feed materials, read 2024'),
        sigmaRule: 'horwitz-thompson',
        sigmaPercent: null,
      },
      {
        code: 'DON',
        name: 'Deoxynivalenol',
        decimals: 0,
        decisionLimit: 5000,
        decisionLimitSource: example(`${FEED_ADVICE}, compound feed`),
        sigmaRule: 'horwitz',
        sigmaPercent: null,
      },
      {
        code: 'ZEN',
        name: 'Zearalenone',
        decimals: 1,
        decisionLimit: 250,
        decisionLimitSource: example(`${FEED_ADVICE}, sows and fattening pigs`),
        sigmaRule: 'percent',
        sigmaPercent: 25,
      },
      {
        code: 'OTA',
        name: 'Ochratoxin A',
        decimals: 2,
        decisionLimit: 50,
        decisionLimitSource: example(`${FEED_ADVICE}, compound feed for pigs`),
        sigmaRule: 'horwitz-thompson',
        sigmaPercent: null,
      },
      {
        code: 'AFM1',
        name: 'Aflatoxin M1',
        decimals: 3,
        decisionLimit: 0.5,
        decisionLimitSource: example(
          '0.050 ug/kg in milk, (EU) 2023/915 of May 2023, over a tenfold concentration',
        ),
        sigmaRule: 'horwitz-thompson',
        sigmaPercent: null,
      },
    ],
  },
];
