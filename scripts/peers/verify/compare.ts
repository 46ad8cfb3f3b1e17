import type { PeerCase } from './cases';
import type { Figures } from './inputs';
import { ours } from './ours';
import { ruleOf } from './rules';

export interface Comparison {
  readonly figure: string;
  /** Off by this share of the expected value, or of the unit that the rule names. */
  readonly difference: number;
  readonly tolerance: number;
  readonly found: number | null;
  readonly expected: number;
}

/** This library's figures of one case beside those of a peer; figures that only the peer has serve as units. */
export function compare(entry: PeerCase, peer: string, expected: Figures): Comparison[] {
  const found = ours(entry);
  return Object.entries(expected).flatMap(([figure, value]) => {
    if (value === null || !(figure in found)) return [];
    const rule = ruleOf(peer, entry.task, figure);
    if (rule.unless?.(entry, expected)) return [];
    const unit = typeof rule.unit === 'string' ? Math.abs(expected[rule.unit] ?? 0) : (rule.unit ?? 0);
    const own = found[figure] ?? null;
    const difference = off(own, value, unit);
    return [{ figure, difference, tolerance: rule.tolerance, found: own, expected: value }];
  });
}

function off(found: number | null, expected: number, unit: number): number {
  if (found === null || Number.isNaN(found)) return Infinity;
  if (found === expected) return 0;
  if (!Number.isFinite(expected)) return Infinity;
  return Math.abs(found - expected) / Math.max(Math.abs(expected), unit, Number.MIN_VALUE);
}
