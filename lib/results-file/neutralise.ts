/** Text that a spreadsheet would take for a formula, and text that already bears our apostrophe before such. */
const RISKY = /^'*[=+\-@\t\r\n]/;
const MARKED = /^'+[=+\-@\t\r\n]/;
const PLAIN_NUMBER = /^[+-]?(\d+([.,]\d*)?|[.,]\d+)([eE][+-]?\d+)?$/;

/**
 * On the way out: an apostrophe before a cell that begins with = + - @, a tab or a line break, so that no
 * spreadsheet runs it. Plain numbers such as -0.3 stay. Text that begins with apostrophes and then such a sign
 * gets one more, so that restoreCell gives back every text.
 */
export function neutraliseCell(text: string): string {
  return RISKY.test(text) && !PLAIN_NUMBER.test(text) ? `'${text}` : text;
}

/** On the way in: takes off one leading apostrophe when a sign that neutraliseCell guards against follows. */
export function restoreCell(text: string): string {
  return text.startsWith("'") && MARKED.test(text) ? text.slice(1) : text;
}
