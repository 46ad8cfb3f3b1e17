import { describe, expect, it } from 'vitest';
import { currentPlace, laboratoryStages, type OwnPart } from '@/components/laboratory/laboratory-stages';
import {
  isOnTrendAxis,
  trendChartPoints,
  trendScoreName,
  type TrendScore,
} from '@/components/laboratory/trend-rows';

const NOW = '2026-12-01T08:00:00.000Z';
const PART: OwnPart = {
  slug: 'maize-1',
  state: 'open',
  isPast: false,
  dispatchAt: '2026-11-10T08:00:00.000Z',
  closesAt: '2026-12-10T08:00:00.000Z',
  publishAt: '2026-12-20T08:00:00.000Z',
  closedAt: null,
  publishedAt: null,
  cancelledAt: null,
  enrolmentState: 'enrolled',
  enrolledAt: '2026-11-01T08:00:00.000Z',
  decidedAt: '2026-11-02T08:00:00.000Z',
  itemsReceivedAt: null,
  submittedAt: null,
};

function statesOf(change: Partial<OwnPart>) {
  return laboratoryStages({ ...PART, ...change }, NOW).map((stage) => `${stage.label}: ${stage.state}`);
}

describe("a laboratory's stages", () => {
  it.each<[string, Partial<OwnPart>, string[]]>([
    [
      'invited',
      { enrolmentState: 'invited', state: 'draft' },
      ['Invitation: due', 'Items: later', 'Results: later', 'Review: later', 'Scores: later'],
    ],
    [
      'items on their way',
      {},
      ['Invitation: done', 'Items: due', 'Results: due', 'Review: later', 'Scores: later'],
    ],
    [
      'results late',
      { closesAt: '2026-11-30T08:00:00.000Z', itemsReceivedAt: NOW },
      ['Invitation: done', 'Items received: done', 'Results: overdue', 'Review: later', 'Scores: later'],
    ],
    [
      'under review past the planned date',
      { state: 'evaluated', submittedAt: NOW, publishAt: '2026-11-30T08:00:00.000Z' },
      ['Invitation: done', 'Items sent: done', 'Results sent: done', 'Review: current', 'Scores: overdue'],
    ],
    [
      'published without results',
      { state: 'published', publishedAt: NOW },
      ['Invitation: done', 'Items sent: done', 'No results sent: done', 'Review: done', 'Scores: done'],
    ],
  ])('%s', (_, change, states) => {
    expect(statesOf(change)).toEqual(states);
  });

  it('lead to their part of the page, and to no scores before they are published', () => {
    const hrefs = laboratoryStages(PART, NOW).map(({ href }) => href);
    expect(hrefs).toEqual([
      '/laboratory/rounds/maize-1#invitation',
      '/laboratory/rounds/maize-1#items',
      '/laboratory/rounds/maize-1#results',
      null,
      null,
    ]);
  });

  it('strike out what a cancelled round did not reach', () => {
    expect(statesOf({ state: 'cancelled' }).filter((text) => text.endsWith('cancelled'))).toHaveLength(2);
  });

  it('say where the round stands for its laboratory', () => {
    expect(currentPlace(PART)).toBe('items');
    expect(currentPlace({ ...PART, itemsReceivedAt: NOW })).toBe('results');
    expect(currentPlace({ ...PART, state: 'closed' })).toBe('review');
    expect(currentPlace({ ...PART, enrolmentState: 'invited' })).toBe('invitation');
    expect(currentPlace({ ...PART, state: 'published' })).toBe('scores');
  });
});

describe('the trend', () => {
  const SCORE: TrendScore = {
    roundSlug: 'r1',
    roundName: 'Round 1',
    closesAt: NOW,
    roundMeasurandId: 1,
    item: 'M1',
    value: 8,
    assignedValue: 9,
    sigmaPt: 1,
    scoreKind: 'z',
    score: -1,
    signal: 'none',
  };

  it('labels by month, names round and item, and keeps a missing score missing', () => {
    const points = trendChartPoints([
      SCORE,
      { ...SCORE, roundMeasurandId: 2, item: 'M2', score: null, signal: 'not-scored' },
    ]);
    expect(points.map(({ label, score, note }) => [label, score, note])).toEqual([
      ['Dec 2026', -1, 'Round 1, item M1'],
      ['Dec 2026', null, 'Round 1, item M2'],
    ]);
  });

  it('keeps E_n off the axis of z and says which scores are mixed', () => {
    const mixed: TrendScore[] = [SCORE, { ...SCORE, scoreKind: 'z-prime' }, { ...SCORE, scoreKind: 'e-n' }];
    expect(mixed.filter(isOnTrendAxis)).toHaveLength(2);
    expect(trendScoreName(mixed)).toBe("z, z'");
    expect(trendChartPoints(mixed).map(({ note }) => note)).toEqual([
      'Round 1, item M1; z',
      "Round 1, item M1; z'",
    ]);
  });
});
