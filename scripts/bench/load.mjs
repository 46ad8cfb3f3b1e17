import autocannon from 'autocannon';

export const CONNECTIONS = 8;
const WARM_UP_S = 1;
const MEASURED_S = 4;

/**
 * Sends requests over eight connections for four seconds, after one second that does not count. Throws when any
 * answer is not 2xx, since a fast refusal is no throughput.
 * @param body - a function gives each request a body of its own
 */
export async function measureLoad({ url, method = 'GET', headers = {}, body }) {
  const options = { url, method, headers, body };
  await requireOne(options);
  await fire(options, WARM_UP_S);
  const { times, duration } = await fire(options, MEASURED_S);
  if (times.length === 0) throw new Error(`no answer within ${MEASURED_S} s`);
  return { perSecond: times.length / duration, ...percentiles(times), requests: times.length };
}

/** One request alone: what is wrong shows plainly, and whatever the server did for the row before is over. */
async function requireOne({ url, method, headers, body }) {
  const own = typeof body === 'function' ? body() : body;
  const response = await fetch(url, { method, headers, body: own, redirect: 'manual' });
  await response.arrayBuffer();
  if (!response.ok) throw new Error(`answers with status ${response.status}`);
}

async function fire({ url, method, headers, body }, duration) {
  const { pathname, search } = new URL(url);
  const request = { method, path: pathname + search, headers };
  if (typeof body === 'function') request.setupRequest = (own) => ({ ...own, body: body() });
  else if (body !== undefined) request.body = body;
  const times = [];
  const answers = new Map();
  const result = await new Promise((resolve, reject) => {
    const instance = autocannon(
      { url, connections: CONNECTIONS, duration, requests: [request] },
      (error, done) => (error ? reject(error) : resolve(done)),
    );
    instance.on('response', (_client, status, _bytes, time) => {
      times.push(time);
      answers.set(status, (answers.get(status) ?? 0) + 1);
    });
  });
  requireGoodAnswers(result, answers);
  return { times, duration: result.duration };
}

function requireGoodAnswers({ errors, timeouts }, answers) {
  const bad = [...answers].filter(([status]) => status < 200 || status > 299);
  const told = bad.map(([status, count]) => `${count} answers with status ${status}`);
  if (errors > 0) told.push(`${errors} connection errors, ${timeouts} of them timeouts`);
  if (told.length > 0) throw new Error(told.join(', '));
}

/** Percentiles by nearest rank, in milliseconds. */
export function percentiles(times) {
  const sorted = [...times].sort((a, b) => a - b);
  const at = (share) => sorted[Math.max(0, Math.ceil(share * sorted.length) - 1)];
  return { p50: at(0.5), p95: at(0.95), p99: at(0.99) };
}
