import type { RoundValues } from '@/components/forms/round-form';

const DAY_MS = 86_400_000;

function dayAt(now: Date, days: number, time: string): string {
  return `${new Date(now.getTime() + days * DAY_MS).toISOString().slice(0, 10)}T${time}`;
}

/** Dates that fit a usual round: open tomorrow, a week to the dispatch, four weeks to measure, two to evaluate. */
export function newRoundValues(now: Date): RoundValues {
  return {
    name: '',
    isPast: false,
    opensAt: dayAt(now, 1, '08:00'),
    dispatchAt: dayAt(now, 8, '08:00'),
    closesAt: dayAt(now, 36, '17:00'),
    publishAt: dayAt(now, 50, '12:00'),
    instructions: '',
    fee: '',
    feeCurrency: 'EUR',
  };
}

interface PlannedRound {
  name: string;
  isPast: boolean;
  opensAt: string;
  dispatchAt: string;
  closesAt: string;
  publishAt: string;
  instructions: string;
  feeCents: number;
  feeCurrency: string;
}

/** The round as its form shows it; times as the date field of a browser wants them. */
export function roundValues(round: PlannedRound): RoundValues {
  const field = (iso: string) => iso.slice(0, 16);
  return {
    name: round.name,
    isPast: round.isPast,
    opensAt: field(round.opensAt),
    dispatchAt: field(round.dispatchAt),
    closesAt: field(round.closesAt),
    publishAt: field(round.publishAt),
    instructions: round.instructions,
    fee: round.feeCents === 0 ? '' : (round.feeCents / 100).toFixed(2),
    feeCurrency: round.feeCurrency,
  };
}
