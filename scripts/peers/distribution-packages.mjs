/**
 * Holds the distribution functions of jstat and simple-statistics against the recorded values of R, and prints for
 * each how many miss by more than 1e-10 of the value, the worst case, and where each first falls short.
 * usage: node scripts/peers/distribution-packages.mjs
 */
import { readFileSync } from 'node:fs';
import jstat from 'jstat';
import * as simple from 'simple-statistics';

const LIMIT = 1e-10;
const fixture = new URL('../../tests/stats/fixtures/distributions-r.json', import.meta.url);
const { groups } = JSON.parse(readFileSync(fixture, 'utf8'));
const { jStat } = jstat;

/** What each package has; the arguments are those of R. A survival function exists in neither. */
const OFFERED = {
  'jstat normal.cdf': ['normalCdf', (x) => jStat.normal.cdf(x, 0, 1)],
  'jstat 1 - normal.cdf': ['normalSurvival', (x) => 1 - jStat.normal.cdf(x, 0, 1)],
  'jstat normal.inv': ['normalQuantile', (p) => jStat.normal.inv(p, 0, 1)],
  'jstat studentt.cdf': ['studentTCdf', (x, df) => jStat.studentt.cdf(x, df)],
  'jstat studentt.pdf': ['studentTDensity', (x, df) => jStat.studentt.pdf(x, df)],
  'jstat studentt.inv': ['studentTQuantile', (p, df) => jStat.studentt.inv(p, df)],
  'jstat chisquare.cdf': ['chiSquareCdf', (x, df) => jStat.chisquare.cdf(x, df)],
  'jstat 1 - chisquare.cdf': ['chiSquareSurvival', (x, df) => 1 - jStat.chisquare.cdf(x, df)],
  'jstat chisquare.pdf': ['chiSquareDensity', (x, df) => jStat.chisquare.pdf(x, df)],
  'jstat chisquare.inv': ['chiSquareQuantile', (p, df) => jStat.chisquare.inv(p, df)],
  'jstat centralF.cdf': ['fCdf', (x, a, b) => jStat.centralF.cdf(x, a, b)],
  'jstat 1 - centralF.cdf': ['fSurvival', (x, a, b) => 1 - jStat.centralF.cdf(x, a, b)],
  'jstat centralF.pdf': ['fDensity', (x, a, b) => jStat.centralF.pdf(x, a, b)],
  'jstat centralF.inv': ['fQuantile', (p, a, b) => jStat.centralF.inv(p, a, b)],
  'jstat beta.cdf': ['betaCdf', (x, a, b) => jStat.beta.cdf(x, a, b)],
  'jstat beta.pdf': ['betaDensity', (x, a, b) => jStat.beta.pdf(x, a, b)],
  'jstat beta.inv': ['betaQuantile', (p, a, b) => jStat.beta.inv(p, a, b)],
  'jstat binomial.pdf': ['binomialMass', (k, n, p) => jStat.binomial.pdf(k, n, p)],
  'jstat binomial.cdf': ['binomialCdf', (k, n, p) => jStat.binomial.cdf(k, n, p)],
  'simple-statistics cumulativeStdNormalProbability': [
    'normalCdf',
    (x) => simple.cumulativeStdNormalProbability(x),
  ],
  'simple-statistics probit': ['normalQuantile', (p) => simple.probit(p)],
};

function measure(rows, run) {
  let missed = 0;
  let worst = { error: 0, text: '' };
  const started = performance.now();
  for (const row of rows) {
    const [args, expected] = [row.slice(0, -1), row.at(-1)];
    let found = NaN;
    try {
      found = run(...args);
    } catch {
      // counted as NaN
    }
    const error = Number.isNaN(found) ? Infinity : Math.abs((found - expected) / expected);
    if (error > LIMIT) missed += 1;
    if (error > worst.error) worst = { error, text: `(${args.join(', ')}): ${found}, R ${expected}` };
  }
  return { missed, worst, microseconds: ((performance.now() - started) / rows.length) * 1000 };
}

for (const [name, [group, run]] of Object.entries(OFFERED)) {
  const rows = groups[group];
  const { missed, worst, microseconds } = measure(rows, run);
  const head = `${name}: ${missed} of ${rows.length} miss`;
  console.log(
    `${head}; worst ${worst.error.toExponential(1)} at ${worst.text}; ${microseconds.toFixed(1)} us each`,
  );
}
