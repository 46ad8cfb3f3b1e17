import type { DemoLaboratory } from '../scenario/laboratories';
import { scopeOf } from '../scenario/laboratories';
import { METHODS, type MeasurandCode } from '../scenario/methods';
import { SCHEMES, UNIT } from '../scenario/schemes';
import { horwitzThompsonSigma } from '@/lib/stats';
import { habitsOf } from './habits';
import { measure, type Asked } from './measure';
import type { DemoRound } from '../scenario/rounds';
import type { ReportedRow } from './reported-row';

const UG_PER_KG = 1e-9;
const COVERAGE_FACTOR = 2;
/** Measurands of the milligram range, which some laboratories report in that unit. */
const IN_MG: readonly MeasurandCode[] = ['DON', 'FUM'];
const MG_DECIMALS = 3;

interface Writing {
  unit: string;
  /** Text of an amount given in ug/kg. */
  write: (amount: number) => string;
}

function decimalsOf(round: DemoRound, measurand: MeasurandCode): number {
  const scheme = SCHEMES.find((entry) => entry.key === round.scheme);
  const plan = scheme?.measurands.find((entry) => entry.code === measurand);
  if (!plan) throw new Error(`${round.scheme} has no ${measurand}`);
  return plan.decimals;
}

function writingOf({ habits, round }: Asked, measurand: MeasurandCode): Writing {
  if (habits.writesMgPerKg && IN_MG.includes(measurand)) {
    return { unit: 'mg/kg', write: (amount) => (amount / 1000).toFixed(MG_DECIMALS) };
  }
  const decimals = decimalsOf(round, measurand);
  return { unit: UNIT, write: (amount) => amount.toFixed(decimals) };
}

function expandedUncertainty({ laboratory, habits }: Asked, amount: number): number {
  if (habits.statedUncertainty !== null) return habits.statedUncertainty * amount;
  const sigma = horwitzThompsonSigma({ assignedValue: amount, massFractionPerUnit: UG_PER_KG });
  return COVERAGE_FACTOR * METHODS[laboratory.technique].statedUncertainty * sigma;
}

function reportRow(
  asked: Asked,
  item: string,
  measurand: MeasurandCode,
  replicate: number,
  analysedOn: string,
): ReportedRow {
  const { laboratory, habits } = asked;
  const loq = METHODS[laboratory.technique].loq[measurand];
  const { unit, write } = writingOf(asked, measurand);
  const found = measure(asked, item, measurand, replicate);
  const isBelow = found < loq;
  const saysLoq = habits.statesLoq;
  const hasUncertainty = habits.statesUncertainty && !isBelow;
  const limit = saysLoq ? '<LOQ' : `<${write(loq)}`;
  return {
    item,
    measurand,
    replicate,
    result: isBelow ? limit : write(found),
    unit,
    expandedUncertainty: hasUncertainty ? write(expandedUncertainty(asked, found)) : '',
    coverageFactor: hasUncertainty ? String(COVERAGE_FACTOR) : '',
    loq: saysLoq ? write(loq) : '',
    method: laboratory.technique,
    analysedOn,
    comment: '',
  };
}

/** The rows of a laboratory's file for a round, before any slip of the story is made in them. */
export function reportRows(laboratory: DemoLaboratory, round: DemoRound, analysedOn: string): ReportedRow[] {
  const asked = { laboratory, habits: habitsOf(laboratory), round };
  const scope = scopeOf(laboratory);
  return round.items.flatMap((item) =>
    (Object.keys(item.measurands) as MeasurandCode[])
      .filter((measurand) => scope.includes(measurand))
      .flatMap((measurand) =>
        Array.from({ length: round.replicates }, (_, index) =>
          reportRow(asked, item.code, measurand, index + 1, analysedOn),
        ),
      ),
  );
}
