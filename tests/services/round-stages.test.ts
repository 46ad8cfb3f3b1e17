import { expect, it } from 'vitest';
import { actionWords, whoWords } from '@/components/rounds/log-words';
import { resultsMatrix, type ResultOfCode } from '@/components/rounds/results-columns';
import { placeOf, roundStages, type StageInput } from '@/components/rounds/round-stages';
import { newRoundValues } from '@/components/rounds/round-values';
import { resultText } from '@/components/rounds/score-columns';
import { roundSchema } from '@/lib/schemas/rounds';

const ROUND: StageInput['round'] = {
  slug: 'maize-1',
  state: 'open',
  isPast: false,
  opensAt: '2026-11-01T08:00:00.000Z',
  dispatchAt: '2026-11-08T08:00:00.000Z',
  closesAt: '2026-12-10T17:00:00.000Z',
  publishAt: '2026-12-20T12:00:00.000Z',
  openedAt: '2026-11-02T08:00:00.000Z',
  closedAt: null,
  evaluatedAt: null,
  publishedAt: null,
};
const NOBODY = { text: 'No laboratory has sent results yet.', href: '/rounds/maize-1/participants' };
const INPUT: StageInput = {
  round: ROUND,
  next: 'close',
  blockers: [NOBODY],
  signedAt: null,
  now: '2026-12-01T09:00:00.000Z',
};

const statesOf = (input: StageInput) => roundStages(input).map(({ key, state }) => `${key} ${state}`);

it('tells what is done and what is due of an open round', () => {
  expect(statesOf(INPUT)).toEqual([
    'planned done',
    'open done',
    'dispatched done',
    'due due',
    'evaluated later',
    'signed later',
    'published later',
  ]);
});

it('calls missing results a hold-up only once they are due', () => {
  const blockedBy = (input: StageInput) => roundStages(input).find(({ key }) => key === 'due')?.blockedBy;
  expect(blockedBy(INPUT)).toEqual([]);
  const late = { ...INPUT, now: '2026-12-11T00:00:00.000Z' };
  expect(blockedBy(late)).toEqual([NOBODY]);
  expect(statesOf(late)).toContain('due overdue');
});

it('puts a missing signature at the signing and, once signed, what is left at the publication', () => {
  const blocker = { text: 'Not signed.', href: '/rounds/maize-1/evaluation' };
  const evaluated: StageInput = {
    ...INPUT,
    round: { ...ROUND, state: 'evaluated', closedAt: ROUND.closesAt, evaluatedAt: ROUND.closesAt },
    next: 'publish',
    blockers: [blocker],
    now: '2026-12-12T00:00:00.000Z',
  };
  const signed = { ...evaluated, blockers: [], signedAt: '2026-12-12T00:00:00.000Z' };
  expect(roundStages(evaluated).find(({ key }) => key === 'signed')).toMatchObject({
    state: 'current',
    blockedBy: [blocker],
  });
  expect(statesOf(signed).slice(-2)).toEqual(['signed done', 'published due']);
});

it('shows a cancelled round as far as it came', () => {
  const cancelled: StageInput = {
    ...INPUT,
    round: { ...ROUND, state: 'cancelled' },
    next: null,
    blockers: [],
  };
  expect(statesOf(cancelled)).toEqual([
    'planned done',
    'open done',
    'dispatched done',
    'due cancelled',
    'evaluated cancelled',
    'signed cancelled',
    'published cancelled',
  ]);
});

it('is never overdue for a past round', () => {
  const past = { ...INPUT, round: { ...ROUND, isPast: true }, now: '2027-06-01T00:00:00.000Z' };
  expect(statesOf(past)).toContain('due current');
});

it('knows the stage of each page', () => {
  expect(['plan', 'results', 'log', null].map((page) => placeOf(page, null))).toEqual([
    'planned',
    'due',
    '',
    '',
  ]);
  expect([placeOf('evaluation', null), placeOf('evaluation', 'x')]).toEqual(['evaluated', 'signed']);
});

it('proposes dates for a new round that its own form takes', () => {
  const { isPast, ...values } = newRoundValues(new Date('2026-12-01T23:30:00Z'));
  expect(isPast).toBe(false);
  expect(roundSchema.parse({ ...values, name: 'Maize 2' })).toMatchObject({
    opensAt: '2026-12-02T08:00:00.000Z',
    closesAt: '2027-01-06T17:00:00.000Z',
  });
});

const RESULT: ResultOfCode = {
  participantCode: '1234',
  roundMeasurandId: 1,
  replicate: 1,
  resultText: '12,50',
  kind: 'value',
  value: 12.5,
  ownUnit: 'ug/kg',
  uncertaintyText: '',
  expandedUncertainty: null,
  coverageFactor: null,
  loq: null,
  method: '',
  analysedOn: null,
  comment: '',
};

it('shows results as written, and those of another unit with the plan unit first', () => {
  const measurand = { id: 1, itemCode: 'M1', code: 'AFT', unit: 'ug/kg' };
  const { rows } = resultsMatrix(
    [measurand],
    [
      RESULT,
      { ...RESULT, replicate: 2, resultText: '12.9', value: 12.9 },
      { ...RESULT, participantCode: '2222', resultText: '0.0041', value: 4.1, ownUnit: 'mg/kg' },
      { ...RESULT, participantCode: '3333', resultText: '', value: null, kind: 'not-measured' },
    ],
  );
  expect(rows.map(({ cells }) => cells['1'])).toEqual(['12.50; 12.9', '4.1 (0.0041 mg/kg)', 'not measured']);
});

it('shows a result with the decimals of the plan, and more only where more were reported', () => {
  expect([0.23, 0.4246, 1 / 3].map((value) => resultText(value, 3))).toEqual(['0.230', '0.4246', '0.33333']);
  expect(resultText((10.36 + 10.38) / 2, 2)).toBe('10.37');
  expect(resultText(10.370000000000001, 2)).toBe('10.37');
});

it('names people of the provider and hides those of laboratories behind the code', () => {
  const entry = {
    action: 'results.submitted',
    outcome: 'done' as const,
    detail: '',
    userName: 'Mira Voss',
    isStaff: false,
    isToken: false,
    participantCode: '1234',
  };
  expect(whoWords(entry)).toBe('Participant 1234');
  expect(whoWords({ ...entry, isToken: true })).toBe('A program of participant 1234');
  expect(whoWords({ ...entry, participantCode: null })).toBe('Someone');
  const staff = { ...entry, isStaff: true, userName: 'Cora Lind', action: 'enrolment.withdrawn' };
  expect(`${whoWords(staff)} ${actionWords(staff)}`).toBe('Cora Lind withdrew participant 1234');
});
