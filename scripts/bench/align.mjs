/** Names to the left, figures to the right, words at the end of a line as they are; a failure takes the rest of its line. */
export function align(rows, { wordsLast = false } = {}) {
  const full = rows.filter((row) => row.length === rows[0].length);
  const widths = rows[0].map((_, column) => Math.max(...full.map((row) => row[column].length)));
  widths[0] = Math.max(...rows.map((row) => row[0].length));
  return rows.map(([name, ...cells]) => {
    const asIs = (i) => cells.length === 1 || (wordsLast && i === cells.length - 1);
    const right = cells.map((cell, i) => (asIs(i) ? cell : cell.padStart(widths[i + 1])));
    return [name.padEnd(widths[0]), ...right].join('  ').trimEnd();
  });
}
