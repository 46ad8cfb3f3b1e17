import { parseUnit, unitFactorExponent, type Unit } from '@/lib/units';
import { CodeIndex } from './code-index';
import type { PlanMeasurand, ResultsPlan } from './plan';

export type IndexedMeasurand = PlanMeasurand & {
  /** Place in the plan, counted from 0. */
  at: number;
  /** Null when lib/units does not know the plan's unit. */
  parsedUnit: Unit | null;
};

export type PlanIndex = {
  items: CodeIndex<{ code: string; measurands: CodeIndex<IndexedMeasurand> }>;
  /** Every measurand code of the plan, whatever its item. */
  measurands: CodeIndex<string>;
  methods: CodeIndex<string> | null;
};

export function indexPlan(plan: ResultsPlan): PlanIndex {
  const index: PlanIndex = { items: new CodeIndex(), measurands: new CodeIndex(), methods: null };
  const codes = new Set<string>();
  for (const item of plan.items) {
    const measurands = new CodeIndex<IndexedMeasurand>();
    plan.measurands.forEach((measurand, at) => {
      if (measurand.item !== item.code) return;
      const parsed = parseUnit(measurand.unit);
      measurands.add(measurand.measurand, { ...measurand, at, parsedUnit: parsed.ok ? parsed.unit : null });
      codes.add(measurand.measurand);
    });
    index.items.add(item.code, { code: item.code, measurands });
  }
  for (const code of codes) index.measurands.add(code, code);
  if (plan.methods !== null) {
    index.methods = new CodeIndex();
    for (const method of plan.methods) index.methods.add(method, method);
  }
  return index;
}

export type UnitChoice =
  /** The number in the plan's unit is the number as written x 10^exponent. */
  | { ok: true; text: string | null; exponent: number }
  | { ok: false; code: 'unknown-unit' | 'other-unit'; expected: string };

const DIMENSION_WORDS = {
  'mass-fraction': 'mass fraction',
  'mass-concentration': 'mass concentration',
} as const;

/** What the text of a unit cell means for a measurand of the plan. */
export function chooseUnit(text: string, measurand: IndexedMeasurand): UnitChoice {
  if (text === '') return { ok: true, text: null, exponent: 0 };
  if (text === measurand.unit) return { ok: true, text, exponent: 0 };
  const parsed = parseUnit(text);
  const plan = measurand.parsedUnit;
  const asks = `The plan asks for ${measurand.unit}`;
  if (!parsed.ok) {
    if (parsed.suggestion !== null) {
      return {
        ok: false,
        code: 'unknown-unit',
        expected: `Write "${parsed.suggestion}" if that is meant. ${asks}.`,
      };
    }
    const others = plan === null ? '' : ` or a unit that converts to it, such as ${convertible(plan)}`;
    return { ok: false, code: 'unknown-unit', expected: `Write a UCUM code: ${measurand.unit}${others}.` };
  }
  const exponent = plan === null ? null : unitFactorExponent(parsed.unit, plan);
  if (exponent !== null) return { ok: true, text, exponent };
  if (plan === null) return { ok: false, code: 'other-unit', expected: `${asks}.` };
  const [from, to] = [DIMENSION_WORDS[parsed.unit.dimension], DIMENSION_WORDS[plan.dimension]];
  const why = `a ${from} does not convert to a ${to} without a density.`;
  return { ok: false, code: 'other-unit', expected: `${asks}; ${why}` };
}

function convertible(plan: Unit): string {
  const common = plan.dimension === 'mass-fraction' ? ['mg/kg', 'ug/kg'] : ['mg/L', 'ug/L'];
  return common.find((code) => code !== plan.code) ?? plan.code;
}
