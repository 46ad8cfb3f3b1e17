import type { ReactElement } from 'react';
import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, it } from 'vitest';
import type { ResultPoint, ScorePoint } from '@/components/charts/chart-types';
import { DistributionChart } from '@/components/charts/distribution-chart';
import { OrderedScoresChart } from '@/components/charts/ordered-scores-chart';
import { RoundBars } from '@/components/charts/round-bars';
import { ScoreTrendChart } from '@/components/charts/score-trend-chart';

const MINUS = '\u2212';
const points: ScorePoint[] = [
  { code: 'B2', score: -0.5, signal: 'none' },
  { code: 'A1', score: 2.998, signal: 'warning', own: true },
  { code: 'C3', score: 8.9, signal: 'action' },
  { code: 'D4', score: null, signal: 'not-scored' },
];
const results: ResultPoint[] = [
  { code: 'B2', value: 9.5, signal: 'none' },
  { code: 'A1', value: 12.998, signal: 'warning', own: true },
  { code: 'C3', value: 18.9, signal: 'action' },
];
const measured = { assigned: { value: 10, sigmaPt: 1 }, unit: '\u00b5g/kg', decimals: 2 };
const many = (count: number): ScorePoint[] =>
  Array.from({ length: count }, (_, index) => ({
    code: `L${index}`,
    score: (index % 19) / 10,
    signal: 'none',
  }));

const charts: [string, ReactElement][] = [
  ['ordered scores', <OrderedScoresChart key="a" title="z scores" points={points} />],
  ['distribution', <DistributionChart key="b" title="Results" results={results} leftOut={2} {...measured} />],
  [
    'trend',
    <ScoreTrendChart
      key="c"
      title="z over rounds"
      rounds={points.map(({ code, score, signal }) => ({ key: code, label: `Round ${code}`, score, signal }))}
    />,
  ],
  ['own result', <RoundBars key="d" title="Own result" results={results} {...measured} />],
];

describe.each(charts)('%s chart', (_, chart) => {
  const html = renderToStaticMarkup(chart);

  it('is a figure with a caption, a name and a description', () => {
    expect(html).toMatch(/^<figure aria-labelledby=/);
    expect(html).toContain('<figcaption');
    const described = [
      ...html.matchAll(/<svg data-chart=""[^>]*aria-label="[^"]+"[^>]*aria-describedby="([^"]+)"/g),
    ];
    expect(described).toHaveLength(2);
    for (const [, id] of described) expect(html).toContain(`<desc id="${id}">`);
  });

  it('has the numbers as a table behind it', () => {
    expect(html).toContain('Show the numbers');
    expect(html).toContain('<table');
  });

  it('tells signals by shape and word', () => {
    expect(html).toContain('warning signal');
    expect(html).toContain('fill-paper stroke-warning');
    expect(html).toContain('fill-action');
  });

  it('uses classes and no written colours, and no id twice', () => {
    expect(html).not.toMatch(/#[0-9a-f]{3,6}\b/i);
    const ids = [...html.matchAll(/ id="([^"]+)"/g)].map(([, id]) => id);
    expect(new Set(ids).size).toBe(ids.length);
  });

  it('has one tab stop in each drawing and no broken coordinate', () => {
    expect(html.match(/class="chart-mark"/g)?.length).toBeGreaterThan(2);
    expect([...html.matchAll(/tabindex="0" class="chart-mark"/g)]).toHaveLength(2);
    expect(html).not.toMatch(/NaN|undefined|Infinity/);
  });
});

describe('OrderedScoresChart', () => {
  const html = renderToStaticMarkup(<OrderedScoresChart title="z scores" points={points} />);

  it('names each mark with its score and signal', () => {
    expect(html).toContain('aria-label="A1 (own): z = 2.998, warning signal"');
    expect(html).toContain(`aria-label="B2: z = ${MINUS}0.50"`);
    expect(html).toContain('aria-label="C3: z = 8.90, action signal"');
  });

  it('counts who was not scored, and lists them in the table', () => {
    expect(html).toContain('1 participant not scored and left out.');
    expect(html).toMatch(/D4<\/td>.*not scored/);
  });

  it('labels the lines at 2 and 3', () => {
    for (const label of ['+2', '+3', `${MINUS}2`, `${MINUS}3`]) expect(html).toContain(`>${label}</text>`);
  });

  it('describes more than 150 points as a whole', () => {
    expect(renderToStaticMarkup(<OrderedScoresChart title="z" points={many(150)} />)).toContain('chart-mark');
    const whole = renderToStaticMarkup(<OrderedScoresChart title="z" points={many(151)} />);
    expect(whole).not.toContain('chart-mark');
    expect(whole).toMatch(/<svg data-chart=""[^>]*role="img"/);
    expect(whole).toContain('151 scores in ascending order of z');
  });

  it('says so when nothing could be scored', () => {
    expect(renderToStaticMarkup(<OrderedScoresChart title="z" points={points.slice(3)} />)).toContain(
      'No result could be scored.',
    );
  });
});

describe('DistributionChart', () => {
  const html = renderToStaticMarkup(
    <DistributionChart title="Results" results={results} leftOut={2} {...measured} />,
  );

  it('says what was left out and how the curve was made', () => {
    expect(html).toContain('2 results without a figure left out.');
    expect(html).toContain('Gaussian kernel density of bandwidth 0.750');
  });

  it('writes the value of a result beyond the edge', () => {
    expect(html).toMatch(/<text[^>]*class="fill-ink">18\.90<\/text>/);
  });

  it('describes a single result without a range', () => {
    const single = renderToStaticMarkup(
      <DistributionChart title="Results" results={results.slice(0, 1)} {...measured} />,
    );
    expect(single).toContain('1 result, 9.50 \u00b5g/kg; assigned value 10.00');
  });

  it('takes the level of its heading from the page', () => {
    expect(html).toMatch(/<h2 id=/);
    expect(
      renderToStaticMarkup(<DistributionChart title="R" results={results} level={3} {...measured} />),
    ).toMatch(/<h3 id=/);
  });

  it('does not claim a bandwidth for a curve it was given', () => {
    const given = renderToStaticMarkup(
      <DistributionChart title="Results" results={results} density={[{ x: 9, y: 1 }]} {...measured} />,
    );
    expect(given).not.toContain('bandwidth');
  });
});

describe('ScoreTrendChart', () => {
  it('counts the rounds left out', () => {
    const html = renderToStaticMarkup(
      <ScoreTrendChart
        title="z over rounds"
        rounds={[
          { key: '1', label: '2026-1', score: 0.1, signal: 'none' },
          { key: '2', label: '2026-2', score: null, signal: 'not-scored', note: 'below LOQ' },
        ]}
      />,
    );
    expect(html).toContain('1 round without a score is left out; the line is broken there.');
    expect(html).toContain('not scored; below LOQ');
  });
});
