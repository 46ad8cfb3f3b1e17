import { horwitzThompsonSigma } from '@/lib/stats';
import type { DemoLaboratory } from '../scenario/laboratories';
import { METHODS, type MeasurandCode } from '../scenario/methods';
import { ROUNDS, type DemoRound } from '../scenario/rounds';
import { streamFor } from '../story/random';
import type { Habits } from './habits';
import { trueLevel } from './levels';

const UG_PER_KG = 1e-9;
/** Of a laboratory's scatter in a round, the part that all its results share. */
const SHARED_PART = 0.7;
/** How much wider a laboratory with heavy tails scatters. */
const TAIL_STRETCH = 2.5;
/** Scatter of replicates as a share of the Horwitz-Thompson scatter. */
const REPEATABILITY = 0.2;
/** No one finds less than this share of what is there by chance alone. */
const LEAST_SHARE = 0.05;

export interface Asked {
  laboratory: DemoLaboratory;
  habits: Habits;
  round: DemoRound;
}

/** What the laboratory's instrument says, ug/kg, before anyone has slipped. */
export function measure(asked: Asked, item: string, measurand: MeasurandCode, replicate: number): number {
  const { laboratory, habits, round } = asked;
  const level = trueLevel(round, item, measurand);
  const sigma = horwitzThompsonSigma({ assignedValue: level, massFractionPerUnit: UG_PER_KG });
  const shared = streamFor('round', round.slug, laboratory.name);
  const own = streamFor('item', round.slug, laboratory.name, item, measurand);
  const repeat = streamFor('replicate', round.slug, laboratory.name, item, measurand, replicate);
  const ownDeviate = habits.hasHeavyTails ? TAIL_STRETCH * own.heavy() : own.normal();
  const scatter = SHARED_PART * shared.normal() + Math.sqrt(1 - SHARED_PART ** 2) * ownDeviate;
  const drift = habits.drift(ROUNDS.indexOf(round));
  const deviation = habits.bias + drift + habits.spread * scatter + REPEATABILITY * repeat.normal();
  const bias = METHODS[laboratory.technique].bias * level;
  return Math.max(LEAST_SHARE * level, level + bias + sigma * deviation);
}
