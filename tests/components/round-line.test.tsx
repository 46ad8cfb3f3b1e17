import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, it } from 'vitest';
import { layOutRoundLine } from '@/components/charts/round-line-geometry';
import { RoundLine, type RoundStage } from '@/components/rounds/round-line';

const day = (date: number) => `2026-12-${String(date).padStart(2, '0')}T00:00:00Z`;

describe('layOutRoundLine', () => {
  it('gives the longer time the longer stretch', () => {
    const { weights } = layOutRoundLine([day(1), day(3), day(11), day(12)], day(1));
    const [first = 0, second = 0, third = 0, last] = weights;
    expect(second).toBeGreaterThan(first);
    expect(first).toBeGreaterThan(third);
    expect(third).toBeGreaterThanOrEqual(1);
    expect(last).toBe(1);
  });

  it('places today within its stretch', () => {
    expect(layOutRoundLine([day(1), day(5), day(9)], day(2)).today).toEqual({ stage: 0, fraction: 0.25 });
    expect(layOutRoundLine([day(1), day(5), day(9)], day(5)).today).toEqual({ stage: 1, fraction: 0 });
  });

  it('keeps today on the line before the first and after the last stage', () => {
    expect(layOutRoundLine([day(5), day(9)], day(1)).today).toEqual({ stage: 0, fraction: 0 });
    expect(layOutRoundLine([day(5), day(9)], day(30)).today).toEqual({ stage: 1, fraction: 1 });
  });

  it('puts a stage without a date between its neighbours', () => {
    const { weights } = layOutRoundLine([day(1), null, day(9)], day(5));
    expect(weights[0]).toBeCloseTo(weights[1] ?? 0, 10);
  });

  it('does not go back in time when dates are out of order', () => {
    const { weights } = layOutRoundLine([day(9), day(2), day(12)], day(10));
    expect(weights.every((weight) => weight >= 1)).toBe(true);
  });

  it('shows no today without any date, and nothing without stages', () => {
    expect(layOutRoundLine([null, null], day(1))).toEqual({ weights: [1, 1], today: null });
    expect(layOutRoundLine([], day(1))).toEqual({ weights: [], today: null });
  });
});

describe('RoundLine', () => {
  const stages: RoundStage[] = [
    { key: 'plan', label: 'Plan', href: '/rounds/r1/plan', at: day(1), state: 'done' },
    { key: 'results', label: 'Results', href: '/rounds/r1/results', at: day(3), state: 'current' },
    {
      key: 'review',
      label: 'Review',
      href: '/rounds/r1/review',
      at: day(8),
      state: 'overdue',
      blockedBy: [
        'The round closes later.',
        { text: '4 laboratories have not submitted.', href: '/rounds/r1/participants' },
      ],
    },
    { key: 'report', label: 'Report', href: null, at: day(20), state: 'later' },
    { key: 'appeal', label: 'Appeals', href: null, at: null, state: 'cancelled' },
  ];
  const html = renderToStaticMarkup(<RoundLine stages={stages} today={day(10)} currentPlace="results" />);

  it('is navigation with the current place named', () => {
    expect(html).toContain('<nav aria-label="Stages of the round"');
    expect(
      html.match(
        /<a[^>]*aria-current="page"[^>]*href="\/rounds\/r1\/results"|<a[^>]*href="\/rounds\/r1\/results"[^>]*aria-current="page"/,
      ),
    ).not.toBeNull();
  });

  it('says each state in words', () => {
    for (const words of [
      'done 1 Dec 2026',
      'now; 3 Dec 2026',
      'overdue by 2 days',
      '20 Dec 2026',
      'cancelled',
    ]) {
      expect(html).toContain(words);
    }
  });

  it('marks today and what holds a stage up, with the way to mend it', () => {
    expect(html).toContain('today, 10 Dec 2026');
    expect(html).toContain('Review is held up');
    expect(html).toMatch(/href="\/rounds\/r1\/participants"[^>]*>4 laboratories have not submitted\./);
  });

  it('does not link a stage that cannot be visited', () => {
    expect(html).not.toMatch(/<a[^>]*>(?:(?!<\/a>).)*Report/);
  });
});
