const AIM = { share: 0.5, firstLoadKilobytes: 60 };

/** The figures as text: one table of requests, one of scripts, and the single times. */
export function describe({ machine, rows, signInToPage, firstLoad, evaluation }) {
  const lines = [
    `\n${machine.node}, ${machine.cpus} processors, ${machine.connections} connections, 4 s a row\n`,
  ];
  lines.push(...describeRows(rows), '', ...describeFirstLoad(firstLoad), '');
  lines.push(describeSignIn(signInToPage), ...describeEvaluation(evaluation));
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

/** Names to the left, figures to the right; a failure takes the rest of its line. */
function align(rows) {
  const full = rows.filter((row) => row.length === rows[0].length);
  const widths = rows[0].map((_, column) => Math.max(...full.map((row) => row[column].length)));
  widths[0] = Math.max(...rows.map((row) => row[0].length));
  return rows.map(([name, ...cells]) => {
    const right = cells.map((cell, i) => (cells.length === 1 ? cell : cell.padStart(widths[i + 1])));
    return [name.padEnd(widths[0]), ...right].join('  ').trimEnd();
  });
}
