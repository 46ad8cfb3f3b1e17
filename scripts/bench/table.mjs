import { align } from './align.mjs';
import { describeStats } from './stats-table.mjs';

const AIM = { share: 0.5, firstLoadKilobytes: 60 };

/** The figures as text: one table of requests, one of scripts, and the single times. */
export function describe({ machine, rows, signInToPage, firstLoad, evaluation, stats }) {
  const lines = [
    `\n${machine.node}, ${machine.cpus} processors, ${machine.connections} connections, 4 s a row\n`,
  ];
  lines.push(...describeRows(rows), '', ...describeFirstLoad(firstLoad), '');
  lines.push(describeSignIn(signInToPage), ...describeEvaluation(evaluation));
  lines.push(describeStats(stats));
  return lines.join('\n');
}

function describeRows(rows) {
  const header = ['', 'requests/s', 'p50 ms', 'p95 ms', 'p99 ms', 'of the bare one'];
  const body = rows.map((row) => {
    if (row.error) return [row.name, `failed: ${row.error}`];
    const share =
      row.share === null
        ? ''
        : `${Math.round(row.share * 100)} %${row.share < AIM.share ? ' (aim 50 %)' : ''}`;
    return [
      row.name,
      row.perSecond.toFixed(0),
      row.p50.toFixed(1),
      row.p95.toFixed(1),
      row.p99.toFixed(1),
      share,
    ];
  });
  return align([header, ...body]);
}

function describeFirstLoad(rows) {
  const header = ['first-load scripts', 'kB gzip', 'above the bare page'];
  const body = rows.map((row) => {
    if (row.error) return [row.name, `failed: ${row.error}`];
    const note = row.above > AIM.firstLoadKilobytes ? ` (aim at most ${AIM.firstLoadKilobytes})` : '';
    return [row.name, row.kilobytes.toFixed(1), `${row.above.toFixed(1)}${note}`];
  });
  return align([header, ...body]);
}

function describeSignIn(row) {
  if (row.error) return `sign-in to page: failed: ${row.error}`;
  return `sign-in to page: median ${row.p50.toFixed(0)} ms, p95 ${row.p95.toFixed(0)} ms (${row.count} times)`;
}

function describeEvaluation(evaluation) {
  if (evaluation.error) return [`evaluation of 30 laboratories: failed: ${evaluation.error}`];
  const line = (name, { median, p5, p95, runs }) =>
    `evaluation of 30 laboratories${name}: median ${median.toFixed(3)} ms, ${p5.toFixed(3)} to ${p95.toFixed(3)} ms in nine of ten (${runs} runs)`;
  return [line('', evaluation.plain), line(' with its working', evaluation.withWorking)];
}
