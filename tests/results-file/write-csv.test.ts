import fc from 'fast-check';
import Papa from 'papaparse';
import { describe, expect, it } from 'vitest';
import { neutraliseCell, readResultsFile, resultsTemplate, restoreCell, writeCsv } from '@/lib/results-file';
import { PLAN, TODAY, utf8 } from './fixtures';

describe('writeCsv', () => {
  it('writes RFC 4180 with CRLF', () => {
    const rows = [
      { name: 'a "b", c', value: 1.5 },
      { name: 'two\nlines', value: null },
      { name: 'lone\rreturn', value: Number.NaN },
    ];
    expect(writeCsv(rows, ['name', { key: 'value', header: 'Value' }])).toBe(
      'name,Value\r\n"a ""b"", c",1.5\r\n"two\nlines",\r\n"lone\rreturn",\r\n',
    );
  });

  it('writes decimal commas where they are asked for', () => {
    const rows = [{ a: 1.5, b: '2.5' }];
    expect(writeCsv(rows, ['a', 'b'], { separator: ';', decimalMark: ',' })).toBe('a;b\r\n1,5;2.5\r\n');
    expect(writeCsv(rows, ['a', 'b'], { separator: ',', decimalMark: ',' })).toBe('a,b\r\n"1,5",2.5\r\n');
  });

  it('writes the header when there are no rows', () => {
    expect(writeCsv([], ['a', '=b'], { separator: '\t' })).toBe("a\t'=b\r\n");
  });
});

describe('neutraliseCell', () => {
  it.each([
    ['=1+1', "'=1+1"],
    ['+A1', "'+A1"],
    ['-A1', "'-A1"],
    ['-', "'-"],
    ['@SUM(A1)', "'@SUM(A1)"],
    ['\t=1', "'\t=1"],
    ['\r=1', "'\r=1"],
    ['\n=1', "'\n=1"],
    ["'=1", "''=1"],
  ])('%j goes out as %j and comes back', (text, safe) => {
    expect(neutraliseCell(text)).toBe(safe);
    expect(restoreCell(safe)).toBe(text);
  });

  it.each(['-0.3', '+12,5', '-1e-3', '12.5', '<2.0', "'s Graven", "'12", '', 'a=b'])('%j stays', (text) => {
    expect(neutraliseCell(text)).toBe(text);
    expect(restoreCell(text)).toBe(text);
  });

  it('gives back every text through a file, and no cell of it begins a formula', () => {
    const cell = fc.string({
      unit: fc.constantFrom('=', '+', '-', '@', "'", '"', '\t', '\r', '\n', ',', ';', 'a', '1', '.'),
    });
    fc.assert(
      fc.property(
        fc.array(fc.tuple(cell, cell), { minLength: 1 }),
        fc.constantFrom(',', ';', '\t'),
        (pairs, separator) => {
          const rows = pairs.map(([a, b]) => ({ a, b: `x${b}` }));
          const csv = writeCsv(rows, ['a', 'b'], { separator });
          const cells = Papa.parse<string[]>(csv, { delimiter: separator, newline: '\r\n' }).data.slice(
            1,
            -1,
          );
          expect(cells.map(([a = '', b = '']) => ({ a: restoreCell(a), b: restoreCell(b) }))).toEqual(rows);
          for (const [a = ''] of cells) expect(a).toMatch(/^(?![=@\t\r\n])(?![+-](?![\d.]))/);
        },
      ),
      { seed: 20261201 },
    );
  });
});

describe('resultsTemplate', () => {
  it('has one row for each item, measurand and replicate', () => {
    expect(resultsTemplate(PLAN, { separator: ';' }).split('\r\n')).toEqual([
      'item;measurand;replicate;result;unit;expanded_uncertainty;coverage_factor;loq;method;analysed_on;comment',
      'M1;AFT;1;;ug/kg;;;;;;',
      'M1;AFT;2;;ug/kg;;;;;;',
      'M1;DON;1;;ug/kg;;;;;;',
      'M2;DON;1;;mg/kg;;;;;;',
      '',
    ]);
  });

  it('fills in the only method sheet', () => {
    expect(resultsTemplate({ ...PLAN, methods: ['LC-2'] })).toContain('M2,DON,1,,mg/kg,,,,LC-2,,');
  });

  it('is taken once the results are in it, and asks for them before', () => {
    const template = resultsTemplate(PLAN);
    const options = { kind: 'laboratory', today: TODAY } as const;
    expect(readResultsFile(utf8(template), PLAN, options).problems.map(({ code }) => code)).toEqual(
      Array.from({ length: 4 }, () => 'reason-missing'),
    );
    const filled = readResultsFile(utf8(template.replaceAll(/(,\d),,/g, '$1,12.5,')), PLAN, options);
    expect(filled).toMatchObject({ ok: true, notices: [] });
    expect(filled.results).toHaveLength(4);
  });
});
