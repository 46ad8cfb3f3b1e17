import { say } from './report.mjs';

const COLUMNS_SHOWN = ['item', 'measurand', 'replicate', 'result', 'unit'];
const RESULT_SHOWN = '4.2';
const FETCH_WITHIN_MS = 5_000;

/** Prints the demonstration's sign-ins as a table and, for one laboratory, its token and a command that uses it. */
export async function sayDemo({ signIns, tokens }, address) {
  if (signIns.length > 0) {
    say('\nSign-ins of the demonstration. People and laboratories are invented, the passwords are public.');
    for (const row of table(
      signIns.map(({ role, name, email, password }) => [role, name, email, password]),
    )) {
      say(`  ${row}`);
    }
  }
  const [token] = tokens;
  if (!token) return;
  say(`\nUpload token of ${token.laboratory}, for ${token.round}`);
  say(`  ${token.token}`);
  const command = await curlExample(token, address);
  if (command === null) return;
  say('\nCheck results from a script; nothing is submitted until ?check=1 is left out');
  say(`  ${command}`);
}

function table(rows) {
  const widths = rows[0].map((_, column) => Math.max(...rows.map((row) => String(row[column]).length)));
  return rows.map((row) =>
    row
      .map((cell, column) => String(cell).padEnd(widths[column] + 2))
      .join('')
      .trimEnd(),
  );
}

/** A command that can be pasted: one row of the round's own template with a made-up result. */
export async function curlExample({ round, token, item, measurand }, address) {
  const template = await fetchTemplate(`${address}/api/rounds/${round}/template`, token);
  if (template === null) return null;
  const [header, ...rows] = fillTemplate(template);
  const isAsked = (row) =>
    row[header.indexOf('item')] === item && row[header.indexOf('measurand')] === measurand;
  const shown = [header, rows.find(isAsked) ?? rows[0] ?? []];
  const csv = shown.map((cells) => cells.join(',')).join('\\n');
  return [
    `printf '${csv.replaceAll('%', '%%').replaceAll("'", "'\\''")}\\n'`,
    `| curl -sS --data-binary @- -H 'Content-Type: text/csv' -H 'Authorization: Bearer ${token}'`,
    `'${address}/api/rounds/${round}/results?check=1'`,
  ].join(' ');
}

async function fetchTemplate(url, token) {
  try {
    const headers = { authorization: `Bearer ${token}` };
    const response = await fetch(url, { headers, signal: AbortSignal.timeout(FETCH_WITHIN_MS) });
    return response.ok ? await response.text() : null;
  } catch {
    // The example is a courtesy; without it the rest still stands.
    return null;
  }
}

/** The template's header and rows in the columns worth showing, each with the result. Codes and units hold no commas. */
export function fillTemplate(template, result = RESULT_SHOWN) {
  const lines = template
    .replace(/^\uFEFF/, '')
    .split(/\r?\n/)
    .filter((line) => line.trim());
  const [header = [], ...rows] = lines.map((line) => line.split(','));
  const shown = COLUMNS_SHOWN.filter((name) => header.includes(name));
  const filled = rows.map((cells) =>
    shown.map((name) => (name === 'result' ? result : (cells[header.indexOf(name)] ?? ''))),
  );
  return [shown, ...filled];
}
