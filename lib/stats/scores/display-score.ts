import { formatStatistic } from '../display/format-statistic';
import type { ScoreKind } from './limits';
import { signalOf } from './signal-of';

const USUAL_DECIMALS = 2;
/** With so many decimals every double near a limit is told from the limit. */
const MOST_DECIMALS = 17;

/**
 * A score as text: two decimals, and more where two would show it on the other side of a limit.
 *
 * A warning of 2.998 is shown as 2.998 and not as 3.00, which would read as an action signal.
 *
 * @param value - the score, unrounded. Domain: finite.
 * @param kind - which score it is
 * @returns the text, with a plain hyphen-minus, never "-0.00"
 * @throws StatsError not-finite
 *
 * Numerics: decimal rounding of the shortest text, half to even.
 * Source: rule of this library, so that figure and signal agree.
 * Checked by: tests/stats/scores/display-score.test.ts.
 * @example displayScore(2.998, 'z') // => '2.998'
 */
export function displayScore(value: number, kind: ScoreKind): string {
  const signal = signalOf(kind, value);
  for (let decimals = USUAL_DECIMALS; decimals < MOST_DECIMALS; decimals += 1) {
    const text = formatStatistic(value, decimals);
    if (signalOf(kind, Number(text)) === signal) return text;
  }
  return formatStatistic(value, MOST_DECIMALS);
}
