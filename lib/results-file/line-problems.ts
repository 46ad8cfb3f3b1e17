import type { Findings } from './problem';
import type { LineDefect } from './scan-lines';
import { MAX_LINE, MAX_LINES } from './limits';
import { quoteFound } from './quote-found';

const QUOTING = 'Put quotation marks around the whole cell and write a quotation mark within it twice.';

/** Says why a file was not split into rows at all. */
export function neverParsed(defect: LineDefect, findings: Findings): void {
  const { found } = defect;
  if (defect.kind === 'unclosed-quote') {
    findings.problem({
      code: 'unclosed-quote',
      line: defect.line,
      found,
      foundWords: `a cell opens with a quotation mark that is never closed: ${quoteFound(found)}`,
      expected: QUOTING,
    });
  } else if (defect.kind === 'stray-quote') {
    const where = defect.closeLine === defect.line ? '' : ` on line ${defect.closeLine}`;
    findings.problem({
      code: 'stray-quote',
      line: defect.line,
      found,
      foundWords: `a cell in quotation marks has text after its closing mark${where}: ${quoteFound(found)}`,
      expected: QUOTING,
    });
  } else if (defect.kind === 'line-too-long') {
    const most = MAX_LINE.toLocaleString('en-GB');
    findings.problem({
      code: 'line-too-long',
      line: defect.line,
      found,
      foundWords: `the line has ${found}`,
      expected: `A line has at most ${most}; each result stands on a line of its own.`,
    });
  } else {
    const most = MAX_LINES.toLocaleString('en-GB');
    findings.problem({
      code: 'too-many-rows',
      found,
      foundWords: `the file has ${found}`,
      expected: `At most ${most} lines are taken. Divide the file.`,
    });
  }
}
