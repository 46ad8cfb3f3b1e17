import { describe, expect, it } from 'vitest';
import { readResultsFile, type ReadFile } from '@/lib/results-file';
import { file, HEADER, join, PLAN, resultFile, TODAY, utf16, utf8, windows1252 } from './fixtures';

function read(content: string | Uint8Array): ReadFile {
  const bytes = typeof content === 'string' ? utf8(content) : content;
  return readResultsFile(bytes, PLAN, { kind: 'laboratory', today: TODAY });
}

/** Reads a file that must be good. */
function results(content: string | Uint8Array) {
  const checked = read(content);
  expect(checked.problems).toEqual([]);
  expect(checked.ok).toBe(true);
  return checked.results;
}

function noticesOf(content: string | Uint8Array, code: string): string[] {
  return read(content)
    .notices.filter((notice) => notice.code === code)
    .map(({ message }) => message);
}

describe('a full row', () => {
  it('keeps the text and both units', () => {
    const [row] = results(file('M1,AFT,2,<0.0120,mg/kg,0.0008,2.5,0.010,lc-2,2026-11-30,"one, two"'));
    expect(row).toEqual({
      line: 2,
      roundMeasurandId: 11,
      item: 'M1',
      measurand: 'AFT',
      replicate: 2,
      resultText: '<0.0120',
      kind: 'below',
      limitOrValue: 12,
      valueInOwnUnit: 0.012,
      unitText: 'mg/kg',
      unit: 'ug/kg',
      expandedUncertaintyText: '0.0008',
      expandedUncertaintyInOwnUnit: 0.0008,
      expandedUncertainty: 0.8,
      coverageFactor: 2.5,
      loqText: '0.010',
      loq: 10,
      method: 'LC-2',
      analysedOn: '2026-11-30',
      comment: 'one, two',
      laboratory: null,
      laboratoryId: null,
    });
  });

  it('leaves what is not given null, and takes replicate 1', () => {
    const [row] = results('item,measurand,result\nM1,AFT,12.5\n');
    expect(row).toMatchObject({
      replicate: 1,
      unitText: null,
      coverageFactor: null,
      loq: null,
      comment: null,
    });
  });

  it('takes a coverage factor of 2 where an uncertainty stands without one', () => {
    expect(results(resultFile('12.5', ',,0.8,,,,,'))[0]?.coverageFactor).toBe(2);
  });

  it('takes today and any method when methods are not checked', () => {
    const plan = { ...PLAN, methods: null };
    const bytes = utf8(resultFile('12.5', `,,,,,own,${TODAY},`));
    const checked = readResultsFile(bytes, plan, { kind: 'laboratory', today: TODAY });
    expect(checked.results[0]).toMatchObject({ method: 'own', analysedOn: TODAY });
  });
});

describe('a result cell', () => {
  it.each([
    ['12.5', 'value', 12.5],
    ['.5', 'value', 0.5],
    ['5.', 'value', 5],
    ['007', 'value', 7],
    ['+12.5', 'value', 12.5],
    ['1.2e-3', 'value', 0.0012],
    ['1.2E+03', 'value', 1200],
    ['-0.3', 'value', -0.3],
    ['\u22120.3', 'value', -0.3],
    ['-0', 'value', 0],
    ['\u00a012.5\u00a0', 'value', 12.5],
    ['<2.0', 'below', 2],
    ['< 2.0', 'below', 2],
    ['<\u00a02.0', 'below', 2],
    ['>300', 'above', 300],
    ['"12.5"', 'value', 12.5],
  ])('%j is read', (cell, kind, value) => {
    const [row] = results(resultFile(cell));
    expect(row).toMatchObject({ kind, limitOrValue: value, valueInOwnUnit: value });
    expect(Object.is(row?.limitOrValue, -0)).toBe(false);
  });

  it.each(['<LOQ', '< loq'])('%j takes the limit of the loq column', (cell) => {
    const [row] = results(resultFile(cell, ',mg/kg,,,0.002,,,'));
    expect(row).toMatchObject({ kind: 'below', limitOrValue: 2, valueInOwnUnit: 0.002, resultText: cell });
  });

  it('may be empty with a reason', () => {
    const [row] = results(resultFile('', ',,,,,,,broken in transit'));
    expect(row).toMatchObject({ kind: 'not-measured', limitOrValue: null, resultText: '' });
    expect(row?.comment).toBe('broken in transit');
  });
});

describe('what is worth a look', () => {
  it('a negative number', () => {
    const message = 'Line 2, result: "-0.3" is negative; it is taken as it stands.';
    expect(noticesOf(resultFile('-0.3'), 'negative')).toEqual([message]);
  });

  it('a typographic minus', () => {
    const message =
      'Line 2, result: "\u22120.3" begins with the minus sign U+2212 ("\u2212") and is read as -0.3.';
    expect(noticesOf(resultFile('\u22120.3'), 'minus-sign')).toEqual([message]);
  });

  it('a zero', () => {
    const message =
      'Line 2, result: "0.0" is taken as the number zero. If it was not quantified, write <LOQ or a limit.';
    expect(noticesOf(resultFile('0.0'), 'zero')).toEqual([message]);
  });

  it('a number below its own limit of quantification', () => {
    const message = 'Line 2, result: "1.5" is below the limit of quantification in the same row, 2.0.';
    expect(noticesOf(resultFile('1.5', ',,,,2.0,,,'), 'below-loq')).toEqual([message]);
  });

  it('results that the plan asks for and the file does not have', () => {
    expect(noticesOf(resultFile('12.5'), 'not-reported')).toEqual([
      'M1, AFT: the file has 1 of the 2 results that the plan asks for.',
      'M1, DON: the file has no result, and the plan asks for one.',
      'M2, DON: the file has no result, and the plan asks for one.',
    ]);
  });

  it('columns that are not known, with the name that was probably meant', () => {
    const content = 'Item , MEASURAND,result,Expanded Uncertainty,colour,\nM1,AFT,12.5,0.8,yellow,\n';
    expect(noticesOf(content, 'ignored-column')).toEqual([
      'Line 1: the column "Expanded Uncertainty" is not known and is ignored. If it holds expanded_uncertainty, write ' +
        'the header as expanded_uncertainty.',
      'Line 1: the column "colour" is not known and is ignored.',
    ]);
    expect(read(content).ignoredColumns).toEqual(['Expanded Uncertainty', 'colour']);
  });

  it('a column laboratory in a file of one laboratory', () => {
    const content = 'laboratory,item,measurand,result\nMill,M1,AFT,12.5\n';
    expect(read(content)).toMatchObject({ ok: true, ignoredColumns: ['laboratory'] });
  });

  it('a file that is not UTF-8', () => {
    const message =
      'The file is not UTF-8 and was read as Windows-1252. Check its special characters, such as "\u00b5g/kg".';
    expect(noticesOf(windows1252(resultFile('12.5', ',\u00b5g/kg,,,,,,')), 'encoding')).toEqual([message]);
  });
});

describe('encodings', () => {
  const content = file('M1,AFT,1,12.5,\u00b5g/kg,,,,,,gr\u00fcn');

  it.each([
    ['UTF-8', utf8(content), 'UTF-8'],
    ['UTF-8 with a mark', join([0xef, 0xbb, 0xbf], content), 'UTF-8'],
    ['UTF-16LE with a mark', utf16(content, 'LE', true), 'UTF-16LE'],
    ['UTF-16BE with a mark', utf16(content, 'BE', true), 'UTF-16BE'],
    ['UTF-16LE without a mark', utf16(content, 'LE', false), 'UTF-16LE'],
    ['UTF-16BE without a mark', utf16(content, 'BE', false), 'UTF-16BE'],
    ['Windows-1252', windows1252(content), 'Windows-1252'],
  ])('%s', (_name, bytes, encoding) => {
    const checked = read(bytes);
    expect(checked).toMatchObject({ ok: true, encoding });
    expect(checked.results[0]).toMatchObject({
      unitText: '\u00b5g/kg',
      limitOrValue: 12.5,
      comment: 'gr\u00fcn',
    });
  });

  it('reads the upper rows of Windows-1252, which are not those of Latin-1', () => {
    const bytes = windows1252(file('M1,AFT,1,12.5,,,,,,,"5 \u20ac, \u00e9"'));
    expect(results(bytes)[0]?.comment).toBe('5 \u20ac, \u00e9');
  });

  it('takes either micro sign and keeps it', () => {
    for (const unit of ['\u00b5g/kg', '\u03bcg/kg']) {
      expect(results(resultFile('12.5', `,${unit},,,,,,`))[0]).toMatchObject({
        unitText: unit,
        limitOrValue: 12.5,
      });
    }
  });
});

describe('shapes', () => {
  const lines = [
    'item;measurand;result;comment',
    'M1;AFT;12,5;',
    '',
    ';;;',
    'M1;DON;300;"a',
    'b"',
    'M2;DON;1,5;',
  ];

  it.each([
    ['LF', '\n'],
    ['CRLF', '\r\n'],
    ['CR only', '\r'],
  ])('%s, with the physical lines of the rows', (_name, end) => {
    for (const last of ['', end, end + end]) {
      const rows = results(lines.join(end) + last);
      expect(rows.map(({ line, limitOrValue }) => [line, limitOrValue])).toEqual([
        [2, 12.5],
        [5, 300],
        [7, 1.5],
      ]);
      expect(rows[1]?.comment).toBe('a\nb');
    }
  });

  it.each([',', ';', '\t'])('separator %j', (separator) => {
    const checked = read(file('M1,AFT,1,12.5,ug/kg,,,,,,').replaceAll(',', separator));
    expect(checked).toMatchObject({ ok: true, separator, decimalMark: '.' });
  });

  it('a line that tells the separator', () => {
    const checked = read('sep=;\r\nitem;measurand;result\r\nM1;AFT;12,5\r\n');
    expect(checked).toMatchObject({ ok: true, separator: ';', decimalMark: ',' });
    expect(checked.results[0]?.line).toBe(3);
  });

  it('quotes by RFC 4180, spaces after the closing one too', () => {
    const rows = results('"item","measurand","result","comment"\n"M1" ,"AFT","12.5","say ""yes"""   ');
    expect(rows[0]?.comment).toBe('say "yes"');
  });

  it('a million empty rows below the last one', () => {
    expect(results(`item;measurand;result\nM1;AFT;12,5\n${';;\n'.repeat(1_000_000)}`)).toHaveLength(1);
  });

  it('exactly 100,000 rows', () => {
    const plan = {
      ...PLAN,
      measurands: PLAN.measurands.map((measurand) => ({ ...measurand, replicates: 100_000 })),
    };
    const rows = Array.from(
      { length: 100_000 },
      (_, index) => `M1,AFT,${index + 1},12.5,ug/kg,0.8,2,1.0,LC-2,2026-11-30,`,
    );
    const checked = readResultsFile(utf8(`${HEADER}\n${rows.join('\n')}`), plan, {
      kind: 'laboratory',
      today: TODAY,
    });
    expect(checked).toMatchObject({ ok: true, rowCount: 100_000 });
    expect(checked.results.at(-1)).toMatchObject({ line: 100_001, replicate: 100_000 });
  });
});

describe('decimal marks', () => {
  it('are none in a file of whole numbers', () => {
    expect(read(resultFile('12')).decimalMark).toBe(null);
  });

  it('decide 1,234 by the rest of the file', () => {
    const content = 'item,measurand,result\nM1,AFT,"1,234"\nM1,DON,"0,5"\n';
    expect(results(content).map(({ limitOrValue }) => limitOrValue)).toEqual([1.234, 0.5]);
  });

  it('take 1,234 for a decimal comma between semicolons, and say so', () => {
    const content = 'item;measurand;result\nM1;AFT;1,234\n';
    expect(results(content)[0]?.limitOrValue).toBe(1.234);
    expect(noticesOf(content, 'decimal-comma')).toEqual([
      'Line 2, result: "1,234" is read with a decimal comma, not as thousands.',
    ]);
  });

  it('do not hang on cells that are no numbers', () => {
    const content = 'item;measurand;result;analysed_on;comment\nM1;AFT;12,5;2026-11-30;version 1.2\n';
    expect(read(content)).toMatchObject({ ok: true, decimalMark: ',' });
  });
});

describe('many problems', () => {
  it('are counted past the two hundred that are listed', () => {
    const checked = read(`${HEADER}\n${'M9,AFT,1,12.5,,,,,,,\n'.repeat(1000)}`);
    expect(checked.problems).toHaveLength(200);
    expect(checked.unlistedProblems).toBe(800);
  });

  it('stand in the order of lines and columns, every bad cell once', () => {
    const checked = read(file('M9,ZEA,1,x,,-1,0,0,A,1.1.2026,', 'M1,AFT,9,12.5,kg,,,,,,'));
    expect(checked.problems.map(({ line, column }) => `${line} ${column}`)).toEqual([
      '2 item',
      '2 measurand',
      '2 result',
      '2 expanded_uncertainty',
      '2 coverage_factor',
      '2 loq',
      '2 method',
      '2 analysed_on',
      '3 replicate',
      '3 unit',
    ]);
    expect(checked.results).toEqual([]);
  });

  it('take a time in proportion to the file', () => {
    const hostile = [`${'1'.repeat(1990)}x`, `${'x '.repeat(900)}`, `1${' '.repeat(1900)}2`];
    for (const cell of hostile)
      expect(read(`${HEADER}\n${`M1,AFT,1,${cell},,,,,,,\n`.repeat(5000)}`).ok).toBe(false);
  });
});

describe('a plan with a unit that is not known', () => {
  const plan = {
    ...PLAN,
    measurands: PLAN.measurands.map((measurand) => ({ ...measurand, unit: '[CFU]/g' })),
  };

  it('is taken when the file repeats it, and no other', () => {
    const own = readResultsFile(utf8(resultFile('12', ',[CFU]/g,,,,,,')), plan, {
      kind: 'laboratory',
      today: TODAY,
    });
    expect(own).toMatchObject({ ok: true });
    const other = readResultsFile(utf8(resultFile('12', ',ug/kg,,,,,,')), plan, {
      kind: 'laboratory',
      today: TODAY,
    });
    expect(other.problems[0]?.message).toBe('Line 2, unit: found "ug/kg". The plan asks for [CFU]/g.');
  });
});
