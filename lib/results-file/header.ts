import { COLUMNS, knownColumns, requiredColumns, SEPARATOR_WORDS, SEPARATORS } from './columns';
import type { ColumnName, Separator } from './columns';
import type { Findings } from './problem';
import { quoteFound } from './quote-found';
import type { FileKind } from './result-types';

const KNOWN = new Set<string>(COLUMNS);
/** Column names listed in a message before it gets too long to be read. */
const NAMES_SHOWN = 8;

/** A line that some spreadsheets put before the header to tell the separator. */
const SEPARATOR_LINE = /^"?sep=(.?)"?$/i;

export function separatorLine(line: string): string | null {
  return SEPARATOR_LINE.exec(line.trim())?.[1] ?? null;
}

const normalise = (name: string): string => name.trim().toLowerCase();

/** The separator under which the header line has most of the names we know; on a tie, the most cells. */
export function chooseSeparator(headerLine: string): Separator {
  let best: Separator = ',';
  let most = -1;
  for (const separator of SEPARATORS) {
    const names = headerLine.split(separator).map((name) => normalise(name.replace(/^\s*"|"\s*$/g, '')));
    const known = names.filter((name) => KNOWN.has(name)).length;
    const score = known * 1e6 + names.length;
    if (score > most) [best, most] = [separator, score];
  }
  return best;
}

export type Header = { columns: Map<ColumnName, number>; ignored: string[] };

type HeaderRow = { line: number; cells: readonly string[]; separator: Separator; kind: FileKind };

/** Finds the columns by name and writes down what is wrong with the header. */
export function readHeader({ line, cells, separator, kind }: HeaderRow, findings: Findings): Header {
  const known = knownColumns(kind);
  const columns = new Map<ColumnName, number>();
  const ignored: string[] = [];
  const seen = new Map<string, number>();
  cells.forEach((cell, index) => {
    const name = normalise(cell);
    const first = name === '' ? undefined : seen.get(name);
    if (first !== undefined) {
      findings.problem({
        code: 'duplicate-column',
        line,
        column: cell.trim(),
        found: cell.trim(),
        foundWords: `the column ${quoteFound(cell.trim())} stands twice, as column ${first + 1} and column ${index + 1}`,
        expected: 'Keep one of them.',
      });
      return;
    }
    seen.set(name, index);
    const column = known.find((candidate) => candidate === name);
    if (column === undefined) ignored.push(cell.trim());
    else columns.set(column, index);
  });
  complainOfMissing({ line, cells, separator, kind }, columns, findings);
  const named = ignored.filter((name) => name !== '');
  for (const name of named) noticeIgnored(line, name, known, findings);
  return { columns, ignored: named };
}

function complainOfMissing(
  row: HeaderRow,
  columns: ReadonlyMap<ColumnName, number>,
  findings: Findings,
): void {
  const missing = requiredColumns(row.kind).filter((name) => !columns.has(name));
  if (missing.length === 0) return;
  const names = row.cells.map((cell) => quoteFound(cell.trim()));
  const rest = names.length - NAMES_SHOWN;
  const shown = `${names.slice(0, NAMES_SHOWN).join(', ')}${rest > 0 ? ` and ${rest} more` : ''}`;
  const separators = SEPARATORS.map((separator) => SEPARATOR_WORDS[separator]).join(', ');
  const [plural, verb] = missing.length > 1 ? ['columns', 'are'] : ['column', 'is'];
  findings.problem({
    code: 'missing-column',
    line: row.line,
    found: row.cells.join(row.separator),
    foundWords: `the required ${plural} ${listNames(missing)} ${verb} missing; found ${shown}`,
    expected:
      `The first line with content is the header: ${requiredColumns(row.kind).join(', ')} and any of ` +
      `${knownColumns(row.kind)
        .filter((name) => !requiredColumns(row.kind).includes(name))
        .join(', ')}, with one separator between them (${separators}).`,
  });
}

export function listNames(names: readonly string[]): string {
  return names.length < 2 ? names.join('') : `${names.slice(0, -1).join(', ')} and ${names.at(-1)}`;
}

function noticeIgnored(line: number, name: string, known: readonly ColumnName[], findings: Findings): void {
  const letters = (text: string) => text.toLowerCase().replace(/[^a-z]/g, '');
  const meant = known.find((candidate) => letters(candidate) === letters(name));
  const hint = meant === undefined ? '' : ` If it holds ${meant}, write the header as ${meant}.`;
  findings.notice(
    'ignored-column',
    line,
    null,
    `the column ${quoteFound(name)} is not known and is ignored.${hint}`,
  );
}
