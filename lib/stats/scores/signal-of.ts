import { checkFinite } from '../internal/check-values';
import {
  ACTION_LIMIT,
  ALLOWED_PERCENT,
  E_N_LIMIT,
  WARNING_LIMIT,
  type ScoreKind,
  type Signal,
} from './limits';

/**
 * The signal that a score gives, judged on the unrounded value.
 *
 * z, z', zeta: |score| <= 2 none, 2 < |score| < 3 warning, |score| >= 3 action. E_n: above 1 action. P_A: above
 * 100 percent action. A signal asks for a look; it is not a verdict on a laboratory or on a lot.
 *
 * @param kind - which score it is
 * @param value - the score. Unit: none (percent for P_A). Domain: finite.
 * @returns 'none', 'warning' or 'action'
 * @throws StatsError not-finite
 *
 * Numerics: plain comparison; the score functions see to it that binary rounding does not carry a score over a limit.
 * Source: ISO 13528:2022, 9.3 to 9.7.
 * Checked by: tests/stats/scores/signal.test.ts.
 * @example signalOf('z', 2.998) // => 'warning'
 */
export function signalOf(kind: ScoreKind, value: number): Signal {
  checkFinite('signalOf', 'score', value);
  const size = Math.abs(value);
  if (kind === 'e-n') return size > E_N_LIMIT ? 'action' : 'none';
  if (kind === 'p-a') return size > ALLOWED_PERCENT ? 'action' : 'none';
  if (size <= WARNING_LIMIT) return 'none';
  return size < ACTION_LIMIT ? 'warning' : 'action';
}
