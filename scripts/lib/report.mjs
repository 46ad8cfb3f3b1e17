/** A failure that is told in words, without a stack: what happened and what to do. */
export class Stop extends Error {
  constructor(message, { output = '' } = {}) {
    super(message);
    this.name = 'Stop';
    this.output = output;
  }
}

const LABEL_WIDTH = 14;
const OUTPUT_LINES = 80;

let stream = process.stdout;

/** Sends what is said elsewhere, such as to standard error when standard output is for a program. */
export function talkOn(other) {
  stream = other;
}

export function say(text = '') {
  stream.write(`${text}\n`);
}

export function sayStep(name, text) {
  say(name.padEnd(LABEL_WIDTH) + text);
}

/** Runs one step and prints one line for it; `announce` writes the line's beginning when the step takes long. */
export async function step(name, work) {
  let isAnnounced = false;
  const announce = (text) => {
    isAnnounced = true;
    stream.write(`${name.padEnd(LABEL_WIDTH)}${text} ... `);
  };
  try {
    const outcome = await work(announce);
    if (isAnnounced) say(outcome);
    else sayStep(name, outcome);
  } catch (error) {
    if (isAnnounced) say('failed');
    else sayStep(name, 'failed');
    throw error;
  }
}

export function tailOf(output) {
  const lines = output.trimEnd().split('\n');
  const left = lines.length - OUTPUT_LINES;
  return left > 0
    ? [`(${left} lines before these)`, ...lines.slice(-OUTPUT_LINES)].join('\n')
    : lines.join('\n');
}

export function sayFailure(error) {
  if (!(error instanceof Stop)) {
    process.stderr.write(`${error instanceof Error ? error.stack : String(error)}\n`);
    return;
  }
  if (error.output.trim()) process.stderr.write(`\n${tailOf(error.output)}\n\n`);
  process.stderr.write(`${error.message}\n`);
}

export function seconds(since) {
  return `${((Date.now() - since) / 1000).toFixed(1)} s`;
}

/** Runs a script's main function and sets the exit code. */
export async function main(work) {
  try {
    process.exitCode = (await work()) ?? 0;
  } catch (error) {
    sayFailure(error);
    process.exitCode = 1;
  }
}
