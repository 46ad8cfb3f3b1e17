import { checkFinite, checkPositive } from '../internal/check-values';
import { StatsError } from '../stats-error';
import type { WorkingStep } from '../working';
import { coveredOutside, type LogWindow } from './log-windows';

export interface ScreenedResult {
  readonly participant: string;
  readonly value: number;
}

/** A way to be wrong by a factor: reported = factor times true. Both directions are tried. */
export interface ErrorFactor {
  readonly label: string;
  readonly factor: number;
}

export interface GrossErrorScreenInput {
  readonly results: readonly ScreenedResult[];
  readonly assignedValue: number;
  /** sigma_pt, or the robust sd of the results where that is larger. */
  readonly sigma: number;
  readonly unitFactors?: readonly ErrorFactor[];
  readonly methodFactors?: readonly ErrorFactor[];
}

export interface GrossErrorScreenOptions {
  /** |z| from which a result is looked at. */
  readonly screenFrom?: number;
  /** |z| up to which a corrected result counts as explained. */
  readonly matchWithin?: number;
  /** Powers of ten tried, up and down. */
  readonly powers?: number;
  readonly working?: boolean;
}

export interface GrossErrorHint {
  readonly participant: string;
  readonly value: number;
  readonly kind: 'power-of-ten' | 'unit' | 'method' | 'sign';
  readonly label: string;
  readonly factor: number;
  /** value / factor. */
  readonly corrected: number;
  readonly z: number;
  /** Chance that a wild result of any size matches this explanation. */
  readonly chance: number;
  /** Chance that it matches any of the explanations tried. */
  readonly chanceOfAny: number;
}

export interface GrossErrorScreenResult {
  readonly screened: number;
  readonly explanations: number;
  /** Best first for each participant: the smallest |z|. */
  readonly hints: readonly GrossErrorHint[];
  /** Results looked at that nothing explains. */
  readonly unexplained: readonly string[];
  /** Hints expected among the screened results if all were wild for other reasons. */
  readonly expectedByChance: number;
  /** False when the assigned value is within matchWithin sigma of zero: factors cannot be told apart there. */
  readonly factorsUsable: boolean;
  readonly working: readonly WorkingStep[] | null;
}

/**
 * Gross-error screen: is a far result the consensus times a power of ten, a unit factor, a factor of the method, or -1.
 *
 * A hint to ask the laboratory, never a reason to change a figure: what was reported is scored.
 *
 * @param input.results - participant and result. Shape: n entries. Unit: unit of the data. Domain: finite.
 * @param input.assignedValue - x_pt, or the consensus. Unit: unit of the data. Domain: finite; not 0.
 * @param input.sigma - unit of the data. Domain: finite; > 0.
 * @param input.unitFactors - such as { label: 'mg for ug', factor: 1000 }. Domain: factor finite, > 0, not 1.
 * @param input.methodFactors - dilutions, volumes, equivalents of the method sheet; likewise. Default none.
 * @param options.screenFrom - Default 3, the action limit.
 * @param options.matchWithin - Default 2. Domain: > 0, at most screenFrom.
 * @param options.powers - Domain: whole; 1 to 12. Default 6.
 * @param options.working - keep the steps. Default false.
 * @returns see GrossErrorScreenResult
 * @throws StatsError too-few-values without results; not-finite; no-spread; out-of-domain
 *
 * Chance: a wild result is taken as evenly spread on the logarithmic scale over the sizes that the explanations reach,
 *   outside the screened zone. Near a large sigma relative to x_pt the windows are wide and a hint means little.
 * Ties and equal values: allowed. Order of input: kept. Numerics: O(n times explanations).
 * Source: common practice in rounds; the chance is a plain model stated here, no source.
 * Checked by: tests/stats/pairs-and-groups/gross-error-screen.test.ts.
 * @example grossErrorScreen({ results: [{ participant: 'A', value: 101 }], assignedValue: 10, sigma: 0.5 }).hints[0]
 *   // => kind 'power-of-ten', factor 10, corrected 10.1
 */
export function grossErrorScreen(
  input: GrossErrorScreenInput,
  options: GrossErrorScreenOptions = {},
): GrossErrorScreenResult {
  const settings = { screenFrom: 3, matchWithin: 2, powers: 6, working: false, ...options };
  check(input, settings);
  const { results, assignedValue, sigma } = input;
  const explanations = explanationsOf(input, settings.powers);
  const factorsUsable = Math.abs(assignedValue) > settings.matchWithin * sigma;
  const chances = factorsUsable ? chancesOf(explanations, { assignedValue, sigma, ...settings }) : null;
  const zOf = (value: number) => (value - assignedValue) / sigma;
  const far = results.filter(({ value }) => Math.abs(zOf(value)) >= settings.screenFrom);
  const hints: GrossErrorHint[] = [];
  const unexplained: string[] = [];
  for (const { participant, value } of far) {
    const own = explanations
      .map((explanation, i) => {
        const corrected = value / explanation.factor;
        const chance = chances?.each[i] ?? 1;
        return {
          participant,
          value,
          ...explanation,
          corrected,
          z: zOf(corrected),
          chance,
          chanceOfAny: chances?.any ?? 1,
        };
      })
      .filter(({ z }) => factorsUsable && Math.abs(z) <= settings.matchWithin)
      .sort((x, y) => Math.abs(x.z) - Math.abs(y.z));
    hints.push(...own);
    if (own.length === 0) unexplained.push(participant);
  }
  return {
    screened: far.length,
    explanations: explanations.length,
    hints,
    unexplained,
    expectedByChance: chances === null ? 0 : far.length * chances.any,
    factorsUsable,
    working: settings.working ? workingOf(hints, input) : null,
  };
}

type Explanation = Pick<GrossErrorHint, 'kind' | 'label' | 'factor'>;
type Settings = Required<GrossErrorScreenOptions>;

function check({ results, assignedValue, sigma, ...input }: GrossErrorScreenInput, settings: Settings): void {
  const caller = 'grossErrorScreen';
  if (results.length === 0)
    throw new StatsError('too-few-values', `${caller} requires at least 1 result, found 0`);
  checkFinite(caller, 'assigned value', assignedValue);
  if (assignedValue === 0) {
    throw new StatsError('out-of-domain', `${caller} requires an assigned value other than zero, found 0`);
  }
  checkPositive(caller, 'sigma', sigma);
  for (const { participant, value } of results) checkFinite(caller, `result of ${participant}`, value);
  for (const { label, factor } of [...(input.unitFactors ?? []), ...(input.methodFactors ?? [])]) {
    checkPositive(caller, `factor ${label}`, factor);
    if (factor === 1 || !Number.isFinite(1 / factor)) {
      throw new StatsError(
        'out-of-domain',
        `${caller} requires factors that change a result, found ${factor}`,
      );
    }
  }
  const { screenFrom, matchWithin, powers } = settings;
  if (!(matchWithin > 0 && matchWithin <= screenFrom && Number.isFinite(screenFrom))) {
    const found = `found ${matchWithin} and ${screenFrom}`;
    throw new StatsError(
      'out-of-domain',
      `${caller} requires limits above zero, the first at most the second, ${found}`,
    );
  }
  if (!(Number.isInteger(powers) && powers >= 1 && powers <= 12)) {
    throw new StatsError('out-of-domain', `${caller} requires 1 to 12 powers of ten, found ${powers}`);
  }
}

function explanationsOf(input: GrossErrorScreenInput, powers: number): readonly Explanation[] {
  const bothWays = (kind: 'unit' | 'method', factors: readonly ErrorFactor[] = []) =>
    factors.flatMap(({ label, factor }): Explanation[] => [
      { kind, label, factor },
      { kind, label: `${label}, the other way`, factor: 1 / factor },
    ]);
  const tens = Array.from({ length: powers }, (_, i) => i + 1).flatMap((power): Explanation[] => [
    { kind: 'power-of-ten', label: `10^${power}`, factor: 10 ** power },
    { kind: 'power-of-ten', label: `10^-${power}`, factor: Number(`1e-${power}`) },
  ]);
  const all: Explanation[] = [
    ...bothWays('method', input.methodFactors),
    ...bothWays('unit', input.unitFactors),
    ...tens,
    { kind: 'sign', label: 'sign', factor: -1 },
  ];
  // The same factor under two names counts once, by its most particular name.
  return all.filter(({ factor }, i) => {
    const near = (other: Explanation) => Math.abs(other.factor / factor - 1) < 1e-9;
    return all.findIndex(near) === i;
  });
}

/** Chance of each explanation and of any, for a wild result. */
function chancesOf(
  explanations: readonly Explanation[],
  facts: Settings & { readonly assignedValue: number; readonly sigma: number },
): { readonly each: readonly number[]; readonly any: number } {
  const { assignedValue, sigma, matchWithin, screenFrom } = facts;
  const spread = sigma / Math.abs(assignedValue);
  // On a scale where x_pt is 0. The sign has the window about 0, for results of the other sign.
  const own = { from: Math.log1p(-matchWithin * spread), to: Math.log1p(matchWithin * spread) };
  const factors = explanations.filter(({ kind }) => kind !== 'sign');
  const windows = factors.map(({ factor }): LogWindow => {
    const shift = Math.log(factor);
    return { from: own.from + shift, to: own.to + shift };
  });
  const lowest = Math.min(...windows.map(({ from }) => from));
  const highest = Math.max(...windows.map(({ to }) => to));
  const zone = {
    from: screenFrom * spread < 1 ? Math.max(lowest, Math.log1p(-screenFrom * spread)) : lowest,
    to: Math.min(highest, Math.log1p(screenFrom * spread)),
  };
  const outside = highest - lowest - (zone.to - zone.from);
  const share = (length: number) => (outside > 0 ? Math.min(1, length / outside) : 1);
  let next = 0;
  const each = explanations.map(({ kind }) => {
    if (kind === 'sign') return Math.min(1, (own.to - own.from) / (highest - lowest));
    const window = windows[next] as LogWindow;
    next += 1;
    return share(coveredOutside([window], zone));
  });
  return { each, any: share(coveredOutside(windows, zone)) };
}

function workingOf(hints: readonly GrossErrorHint[], input: GrossErrorScreenInput): readonly WorkingStep[] {
  const { assignedValue: x_pt, sigma } = input;
  return hints.flatMap(({ participant, label, value, factor, corrected, z }): WorkingStep[] => {
    const clause = 'screen of gross errors: common practice, no source';
    const name = `${participant}, ${label}`;
    return [
      {
        name: `Corrected: ${name}`,
        formula: 'c = x / factor',
        clause,
        inputs: { x: value, factor },
        value: corrected,
      },
      {
        name: `z: ${name}`,
        formula: 'z = (c - x_pt) / sigma',
        clause,
        inputs: { c: corrected, x_pt, sigma },
        value: z,
      },
    ];
  });
}
