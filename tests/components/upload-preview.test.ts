import { describe, expect, it } from 'vitest';
import { MAX_PREVIEW_ROWS, previewOfResults, previewOfTable } from '@/components/upload/preview';
import { reportSummary } from '@/components/upload/report-summary';
import { readOutcome } from '@/components/upload/upload-outcome';
import { withQuery } from '@/components/upload/send-file';
import { readResultsFile, readTable, type ResultsPlan } from '@/lib/results-file';

const PLAN: ResultsPlan = {
  round: 'Maize 1',
  items: [{ code: 'M1', name: 'Maize' }],
  measurands: [
    { roundMeasurandId: 1, item: 'M1', measurand: 'AFT', name: 'Aflatoxins', unit: 'ug/kg', replicates: 3 },
  ],
  methods: null,
};

function read(text: string) {
  const report = readResultsFile(new TextEncoder().encode(text), PLAN, {
    kind: 'laboratory',
    today: '2026-12-01',
  });
  return { report, table: readTable(text) };
}

describe('the preview of a good file', () => {
  it('shows what was written beside what it was taken as, and no empty column', () => {
    const { report } = read('item;measurand;replicate;result;unit\nM1;AFT;1;0,0084;mg/kg\nM1;AFT;2;<2,0;\n');
    expect(report.problems).toEqual([]);
    const { columns, rows, unshown } = previewOfResults(report.results, report.notices);
    expect(columns.map(({ label }) => label)).toEqual([
      'item',
      'measurand',
      'replicate',
      'result as written',
      'taken as',
    ]);
    expect(rows.map((row) => row.cells.map(({ text }) => text))).toEqual([
      ['M1', 'AFT', '1', '0,0084 mg/kg', '8.4 ug/kg'],
      ['M1', 'AFT', '2', '<2,0', '<2 ug/kg'],
    ]);
    expect(unshown).toBe(0);
  });

  it('puts a notice at its cell', () => {
    const { report } = read('item,measurand,result\nM1,AFT,-3\n');
    const { rows } = previewOfResults(report.results, report.notices);
    const noted = rows[0]?.cells.flatMap((cell) => cell.notes) ?? [];
    expect(noted).toMatchObject([{ kind: 'notice' }]);
    expect(noted[0]?.text).not.toMatch(/^Line/);
  });

  it('stops at a number of rows and counts the rest', () => {
    const [one] = read('item,measurand,result\nM1,AFT,3\n').report.results;
    if (!one) throw new Error('the fixture was refused');
    const many = Array.from({ length: MAX_PREVIEW_ROWS + 7 }, (_, index) => ({ ...one, line: index + 2 }));
    const { rows, unshown } = previewOfResults(many, []);
    expect(rows).toHaveLength(MAX_PREVIEW_ROWS);
    expect(unshown).toBe(7);
  });
});

describe('the preview of a refused file', () => {
  it('puts each problem at the cell where it is', () => {
    const { report, table } = read('item,measurand,result\nM1,AFT,=1+1\nM1,AFT,8\n');
    const { columns, rows } = previewOfTable(table, report.problems, report.notices);
    expect(columns.map(({ label }) => label)).toEqual(['item', 'measurand', 'result']);
    expect(rows[0]?.cells[2]).toEqual({
      text: '=1+1',
      notes: [{ kind: 'problem', text: 'Found "=1+1". Write the value that it gives.' }],
    });
    expect(rows[0]?.cells[0]?.notes).toEqual([]);
  });

  it('keeps the line of a row that has too few cells', () => {
    const { report, table } = read('item,measurand,result\nM1,AFT\nM1,AFT,8\n');
    const { rows } = previewOfTable(table, report.problems, report.notices);
    expect(rows.map(({ line, cells }) => [line, cells.length])).toEqual([
      [2, 0],
      [3, 3],
    ]);
    expect(rows[0]?.notes[0]?.text).toMatch(/^Found 2 cells/);
  });

  it('leaves out good rows of a long file, but counts them', () => {
    const good = Array.from({ length: 300 }, () => 'M1,AFT,8').join('\n');
    const { report, table } = read(`item,measurand,result\nM9,AFT,8\n${good}\n`);
    const unknown = report.problems.filter(({ code }) => code === 'unknown-item');
    const { rows, unshown } = previewOfTable(table, unknown, []);
    expect(rows.map(({ line }) => line)).toEqual([2]);
    expect(unshown).toBe(300);
  });
});

describe('what an answer means', () => {
  it('tells a taken file, a refused file and each setback apart', () => {
    expect(readOutcome(201, '{"receipt":"x"}')).toEqual({ kind: 'answered', body: { receipt: 'x' } });
    expect(readOutcome(422, '{"problems":[],"rowCount":1}')).toMatchObject({
      kind: 'refused-file',
      report: { ok: false, rowCount: 1 },
    });
    expect(readOutcome(401, '{"detail":"Sign in first."}')).toEqual({ kind: 'not-signed-in' });
    expect(readOutcome(409, '{"detail":"Too late."}')).toEqual({ kind: 'refused', detail: 'Too late.' });
    expect(readOutcome(502, '<html>')).toMatchObject({ kind: 'fault' });
    expect(readOutcome(200, 'not json')).toMatchObject({ kind: 'fault' });
  });

  it('says in one sentence how a file was read', () => {
    const { report } = read('item;measurand;result\nM1;AFT;8,4\n');
    expect(reportSummary(report)).toEqual({
      title: '1 row checked, no problem.',
      text: 'Nothing is submitted yet. Read as UTF-8, separated by semicolon, decimal comma.',
    });
  });

  it('adds to an address that has a query already', () => {
    expect(withQuery('/api/x?laboratory=3', { check: '1', name: 'a b&c.csv' })).toBe(
      '/api/x?laboratory=3&check=1&name=a+b%26c.csv',
    );
  });
});
