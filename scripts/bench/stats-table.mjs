import { align } from './align.mjs';

/** The statistics as text: each function beside its peer and beside one sort, and the evaluation of a large round. */
export function describeStats({ functions, round }) {
  return ['', ...describeFunctions(functions), '', ...describeRound(round)].join('\n');
}

function describeFunctions(stats) {
  if (stats.error) return [`statistics: failed: ${stats.error}`];
  const header = [
    'statistics',
    'n',
    'median ms',
    'quartiles',
    'in sorts',
    'peer ms',
    'times as fast',
    'targets',
  ];
  const body = stats.rows.map((row) => {
    const { own, peer } = row;
    return [
      row.name,
      row.n.toLocaleString('en-GB'),
      ms(own.median),
      `${ms(own.low)} to ${ms(own.high)}`,
      (own.median / row.sort).toFixed(1),
      peer.spread ? ms(peer.spread.median) : '-',
      peer.spread ? ratio(peer.spread.median / own.median) : '-',
      ` ${[peer.name, ...row.targets.map(describeTarget), peer.missing].filter(Boolean).join('; ')}`,
    ];
  });
  const judged = stats.rows.flatMap(({ targets }) => targets);
  const count = (met) => judged.filter((target) => target.met === met).length;
  return [
    ...align([header, ...body], { wordsLast: true }),
    `peers: ${stats.versions.r ?? 'R not usable'}; ${stats.versions.scipy ?? 'scipy not usable'}`,
    `targets: ${count(true)} met, ${count(false)} not met, ${count(null)} not judged for want of the peer`,
  ];
}

function describeRound(round) {
  if (round.error) return [`evaluation of a large round: failed: ${round.error}`];
  const { laboratories, measurands, replicates, evaluation, inWorker, withKeeping } = round;
  const delay = ({ took, delayMedian, delayP99, delayMax }) =>
    `${ms(took)} ms; event loop of the server held up ${ms(delayMedian)} ms (median), ${ms(delayP99)} ms (p99), ` +
    `${ms(delayMax)} ms (most), of which 5 ms are the clock's`;
  return [
    `round of ${laboratories} laboratories x ${measurands} measurands x ${replicates} replicates, one core: ` +
      `median ${ms(evaluation.median)} ms, quartiles ${ms(evaluation.low)} to ${ms(evaluation.high)} ms; ` +
      describeTarget({ says: `under ${round.targetMs} ms`, met: round.met }),
    `  in its thread, with reading: ${delay(inWorker)}`,
    `  with keeping it: ${delay(withKeeping)}`,
  ];
}

function describeTarget({ says, met }) {
  const word = met === null ? 'not judged' : met ? 'met' : 'NOT MET';
  return `${says}: ${word}`;
}

function ms(time) {
  return time >= 100 ? time.toFixed(0) : time.toPrecision(3);
}

function ratio(value) {
  return value >= 100 ? value.toFixed(0) : value.toPrecision(2);
}
