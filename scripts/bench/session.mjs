import { performance } from 'node:perf_hooks';

/** Signs in through the credentials endpoint and returns the cookie header of the session. */
export async function signIn(baseUrl, { email, password }) {
  const jar = new Map();
  const csrf = await fetch(`${baseUrl}/api/auth/csrf`);
  keepCookies(jar, csrf);
  const { csrfToken } = await csrf.json();
  const answer = await fetch(`${baseUrl}/api/auth/callback/credentials`, {
    method: 'POST',
    redirect: 'manual',
    headers: { cookie: cookieHeader(jar) },
    body: new URLSearchParams({ csrfToken, email, password, json: 'true' }),
  });
  keepCookies(jar, answer);
  await answer.arrayBuffer();
  if (![...jar.keys()].some((name) => name.endsWith('session-token'))) {
    throw new Error(`${email} could not sign in, status ${answer.status}`);
  }
  return cookieHeader(jar);
}

function keepCookies(jar, response) {
  for (const line of response.headers.getSetCookie()) {
    const pair = line.split(';')[0];
    jar.set(pair.slice(0, pair.indexOf('=')), pair.slice(pair.indexOf('=') + 1));
  }
}

function cookieHeader(jar) {
  return [...jar].map(([name, value]) => `${name}=${value}`).join('; ');
}

/** The times in milliseconds from sending the password to having the whole page. */
export async function timeSignIns(baseUrl, person, page, count) {
  const times = [];
  for (let i = 0; i < count; i += 1) {
    const since = performance.now();
    const cookie = await signIn(baseUrl, person);
    await getPage(baseUrl, page, cookie);
    times.push(performance.now() - since);
  }
  return times;
}

/** The page's HTML; throws unless it is answered with 200. */
export async function getPage(baseUrl, page, cookie) {
  const response = await fetch(baseUrl + page, { headers: cookie ? { cookie } : {}, redirect: 'manual' });
  const html = await response.text();
  if (response.status !== 200) throw new Error(`${page} answers with status ${response.status}`);
  return html;
}
