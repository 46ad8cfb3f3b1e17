import type { WorkingStep } from '../working';
import type { LevelPrecision, PrecisionAgainstLevelResult } from './precision-against-level';

const CLAUSE = 'ISO 5725-2:2019, 7.5';

/** The coefficients of each relation from the list of levels; of the line from its own last weights. */
export function againstLevelWorking(
  levels: readonly LevelPrecision[],
  fits: Pick<PrecisionAgainstLevelResult, 'constant' | 'proportional' | 'linear' | 'logLog'>,
): readonly WorkingStep[] {
  const [m, s] = [levels.map(({ mean }) => mean), levels.map(({ sd }) => sd)];
  const q = levels.length;
  const step = (
    name: string,
    formula: string,
    inputs: WorkingStep['inputs'],
    value: number,
  ): WorkingStep => ({
    name,
    formula,
    clause: CLAUSE,
    inputs,
    value,
  });
  const steps = [step('Constant s', 'a = sum(s) / q', { s, q }, fits.constant.intercept)];
  if (fits.proportional) {
    steps.push(
      step('Proportional, b of s = b m', 'b = sum(s / m) / q', { s, m, q }, fits.proportional.slope),
    );
  }
  if (fits.linear) {
    const { intercept: a, slope: b, fitted } = fits.linear;
    const parts = 'sum(m / f^2) / sum(1 / f^2)';
    const formula = `b = sum((m - ${parts}) * s / f^2) / sum((m - ${parts})^2 / f^2)`;
    steps.push(step('Line, b of s = a + b m', formula, { m, s, f: fitted }, b));
    const centre = 'a = (sum(s / f^2) - b * sum(m / f^2)) / sum(1 / f^2)';
    steps.push(step('Line, a of s = a + b m', centre, { m, s, f: fitted, b }, a));
  }
  if (fits.logLog) {
    const [lg_m, lg_s] = [m.map((x) => Math.log10(x)), s.map((x) => Math.log10(x))];
    const { intercept: c, slope: d } = fits.logLog;
    const slope = 'd = products(lg_m, lg_s) / squares(lg_m)';
    steps.push(step('Log-log, d of lg s = c + d lg m', slope, { lg_m, lg_s }, d));
    const centre = 'c = (sum(lg_s) - d * sum(lg_m)) / q';
    steps.push(step('Log-log, c of lg s = c + d lg m', centre, { lg_m, lg_s, d, q }, c));
  }
  return steps;
}
