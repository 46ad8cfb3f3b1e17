import { fillTemplate } from '../lib/demo.mjs';
import { BARE_PAGE, BARE_ROW } from './bare-app.mjs';
import { getPage, signIn } from './session.mjs';

const RESULT_STEP = 0.001;

/** Who reads and sends in the measurements: a coordinator, someone at a laboratory, and its token. */
export async function readCast(baseUrl, { signIns, tokens, openRound }) {
  const person = (...roles) => {
    const found = signIns.find(({ role }) => roles.includes(role));
    if (!found) throw new Error(`the demonstration has no sign-in with the role ${roles.join(' or ')}`);
    return found;
  };
  const coordinator = person('coordinator');
  const laboratory = person('lab_manager', 'analyst');
  return {
    coordinator,
    coordinatorCookie: await signIn(baseUrl, coordinator),
    laboratoryCookie: await signIn(baseUrl, laboratory),
    token: tokens[0],
    openRound,
  };
}

/** The rounds that the measured pages show, found by the links of the pages themselves. */
export async function findRounds(baseUrl, { coordinatorCookie, laboratoryCookie, openRound }) {
  const all = slugsOf(await getPage(baseUrl, '/rounds', coordinatorCookie), '/rounds/');
  const own = slugsOf(await getPage(baseUrl, '/laboratory', laboratoryCookie), '/laboratory/rounds/');
  for (const slug of all) {
    const headers = { cookie: coordinatorCookie };
    const response = await fetch(`${baseUrl}/api/rounds/${slug}/evaluation`, { headers });
    await response.arrayBuffer();
    if (!response.ok) continue;
    return {
      evaluated: slug,
      own: own[0],
      openPage: await followOnce(`${baseUrl}/rounds/${openRound}`, headers),
    };
  }
  throw new Error('no round of the demonstration has an evaluation');
}

/** A round's own address leads on to the page of its current stage. */
async function followOnce(url, headers) {
  const response = await fetch(url, { headers, redirect: 'manual' });
  await response.arrayBuffer();
  const { pathname } = new URL(response.headers.get('location') ?? url, url);
  return pathname;
}

function slugsOf(html, prefix) {
  const found = html.matchAll(new RegExp(`href="${prefix}([a-z0-9-]+)["/?]`, 'g'));
  return [...new Set([...found].map(([, slug]) => slug))].filter((slug) => slug !== 'new');
}

/** Every row of the table: what it is called, what it is compared with, and the request. */
export async function listRows(app, bare, cast, rounds) {
  const staff = { cookie: cast.coordinatorCookie };
  const laboratory = { cookie: cast.laboratoryCookie };
  const page = (name, path, headers = {}) => ({
    name,
    beside: 'page',
    isPage: true,
    url: app + path,
    path,
    headers,
  });
  return [
    { name: 'bare page', beside: null, url: bare + BARE_PAGE, headers: {} },
    { name: 'bare row as JSON', beside: null, url: bare + BARE_ROW, headers: {} },
    page('front page', '/'),
    page('sign-in page', '/sign-in'),
    page('rounds, coordinator', '/rounds', staff),
    page('open round, coordinator', rounds.openPage, staff),
    page('evaluation with charts, coordinator', `/rounds/${rounds.evaluated}/evaluation`, staff),
    page('today, laboratory', '/laboratory', laboratory),
    page('round, laboratory', `/laboratory/rounds/${rounds.own}`, laboratory),
    {
      name: 'evaluation as JSON',
      beside: 'row',
      url: `${app}/api/rounds/${rounds.evaluated}/evaluation`,
      headers: staff,
    },
    ...(await listUploads(app, cast.token)),
  ];
}

/** Each submission differs from the one before, since the same bytes twice are one submission. */
async function listUploads(app, { round, token }) {
  const authorization = `Bearer ${token}`;
  const template = await fetch(`${app}/api/rounds/${round}/template`, { headers: { authorization } });
  if (!template.ok) throw new Error(`the template of ${round} answers with status ${template.status}`);
  const [header, ...lines] = fillTemplate(await template.text());
  const at = header.indexOf('result');
  let count = 0;
  const body = () => {
    count += 1;
    const result = (1 + count * RESULT_STEP).toFixed(3);
    return [header, ...lines.map((cells) => cells.with(at, result))]
      .map((cells) => cells.join(','))
      .join('\n');
  };
  const upload = { beside: 'row', method: 'POST', headers: { authorization, 'content-type': 'text/csv' } };
  const address = `${app}/api/rounds/${round}/results`;
  return [
    { ...upload, name: `upload check, ${lines.length} rows`, url: `${address}?check=1`, body: body() },
    { ...upload, name: `upload submit, ${lines.length} rows`, url: address, body },
  ];
}
