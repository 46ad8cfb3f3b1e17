import { file, HEADER, join, resultFile, utf16, utf8, windows1252 } from './fixtures';

/** A file that must be refused, and all that must be said of it, word for word. */
export type CarelessFile = { name: string; bytes: Uint8Array; messages: string[] };

const GENERAL = 'Write a number such as 12.5, <2.0, >300 or <LOQ; the unit belongs in the column unit.';
const SAVE_AS = 'Save the sheet as "CSV UTF-8" and upload that file.';
const HEADER_WORDS =
  'The first line with content is the header: item, measurand, result and any of replicate, unit, ' +
  'expanded_uncertainty, coverage_factor, loq, method, analysed_on, comment, with one separator between them ' +
  '(comma, semicolon, tab).';
const QUOTING = 'Put quotation marks around the whole cell and write a quotation mark within it twice.';
const WRITE_ROWS = 'Write a header line and one row for each result.';
const REASON = 'If nothing was measured, leave it empty and give the reason in the column comment.';
const DATE_WORDS = 'Write a date as 2026-03-31: year, month, day';

function text(name: string, content: string, ...messages: string[]): CarelessFile {
  return { name, bytes: utf8(content), messages };
}

function bytes(name: string, content: Uint8Array, ...messages: string[]): CarelessFile {
  return { name, bytes: content, messages };
}

/** A file whose one result is bad. */
function result(cell: string, message: string): CarelessFile {
  return text(`result ${JSON.stringify(cell)}`, resultFile(cell), `Line 2, result: ${message}`);
}

const notText = (kind: string) => `The file is ${kind}, not a CSV text file. ${SAVE_AS}`;

const notCsv: CarelessFile[] = [
  bytes('a PNG', join([0x89], 'PNG\r\n', [0x1a, 0x0a, 0, 0, 0, 13]), notText('a PNG picture')),
  bytes('a JPEG', Uint8Array.of(0xff, 0xd8, 0xff, 0xe0, 0, 16), notText('a JPEG picture')),
  bytes('a GIF', utf8('GIF89a..'), notText('a GIF picture')),
  bytes('a PDF', utf8('%PDF-1.7\n%....'), notText('a PDF document')),
  bytes('an XLSX', join('PK', [3, 4, 20, 0], '..[Content_Types].xml..'), notText('an Excel workbook (XLSX)')),
  bytes(
    'an ODS',
    join('PK', [3, 4, 20, 0], 'mimetypeapplication/vnd.oasis.opendocument.spreadsheet'),
    notText('an OpenDocument spreadsheet'),
  ),
  bytes('a ZIP', join('PK', [3, 4, 20, 0], 'results.csv'), notText('a ZIP archive')),
  bytes('a GZIP', Uint8Array.of(0x1f, 0x8b, 8, 0), notText('a GZIP archive')),
  bytes(
    'an old XLS',
    Uint8Array.of(0xd0, 0xcf, 0x11, 0xe0, 0xa1, 0xb1, 0x1a, 0xe1, 0, 0),
    notText('an old Excel workbook (XLS)'),
  ),
  bytes('UTF-32', join([0xff, 0xfe, 0, 0, 0x69, 0, 0, 0]), notText('UTF-32 text')),
  text('a web page', '<!DOCTYPE html>\n<html><table>', notText('a web page (HTML)')),
  text('an XML spreadsheet', '<?xml version="1.0"?><Workbook/>', notText('an XML document')),
  text('JSON', '[{"item": "M1", "result": 12.5}]', notText('JSON')),
];

const badText: CarelessFile[] = [
  bytes('no bytes', new Uint8Array(), `The file is empty. ${WRITE_ROWS}`),
  text('white space', ' \r\n\t\n', `The file holds nothing but white space. ${WRITE_ROWS}`),
  bytes(
    'a mark and nothing else',
    join([0xef, 0xbb, 0xbf]),
    `The file holds nothing but white space. ${WRITE_ROWS}`,
  ),
  text('separators only', ';;;;\n;;;;\n', `The file holds nothing but empty rows. ${WRITE_ROWS}`),
  text(
    'a header only',
    `${HEADER}\n`,
    'The file has a header and no rows under it. Write one row for each result.',
  ),
  text(
    'a header and empty rows',
    `${HEADER}\n,,,\n\n  ,\n`,
    'The file has a header and no rows under it. Write one row for each result.',
  ),
  text(
    'a NUL byte',
    file('M1,AFT,1,12.5,,,,,,,', 'M1,AFT,2,1\u00002.5,,,,,,,'),
    `Line 3: character 11 is a NUL byte, which no text holds. The file is damaged or not a text file. ${SAVE_AS}`,
  ),
  bytes(
    'UTF-16 cut short',
    utf16(resultFile('12.5'), 'LE', true).slice(0, -1),
    'The file begins as UTF-16LE text and then has bytes that are not UTF-16LE. It may be cut short or joined from two ' +
      `files. ${SAVE_AS}`,
  ),
  bytes(
    'a UTF-8 mark before Windows-1252',
    join([0xef, 0xbb, 0xbf], resultFile('12.5'), [0xb5]),
    `The file begins as UTF-8 text and then has bytes that are not UTF-8. It may be cut short or joined from two files. ${SAVE_AS}`,
  ),
  text(
    'a control code',
    resultFile('12.5', ',,,,,,,ok\u0007'),
    'Line 2, comment: found the control code U+0007 in "ok[U+0007]". Delete the character that cannot be seen.',
  ),
  bytes(
    'more than 20 MB',
    new Uint8Array(20 * 1024 * 1024 + 1).fill(0x20),
    'The file has 20.0 MB. At most 20 MB are taken.',
  ),
  bytes('50 MB', new Uint8Array(50 * 1024 * 1024), 'The file has 50.0 MB. At most 20 MB are taken.'),
];

const badShape: CarelessFile[] = [
  text(
    'a wrong separator',
    'item|measurand|result\nM1|AFT|12.5\n',
    `Line 1: the required columns item, measurand and result are missing; found "item|measurand|result". ${HEADER_WORDS}`,
  ),
  text(
    'no header',
    'M1,AFT,12.5\nM1,DON,300\n',
    `Line 1: the required columns item, measurand and result are missing; found "M1", "AFT", "12.5". ${HEADER_WORDS}`,
  ),
  text(
    'a required column missing',
    '\nitem;measurand;value\nM1;AFT;12.5\n',
    `Line 2: the required column result is missing; found "item", "measurand", "value". ${HEADER_WORDS}`,
  ),
  text(
    'a column twice',
    'item,measurand,result,Result \nM1,AFT,12.5,13\n',
    'Line 1, Result: the column "Result" stands twice, as column 3 and column 4. Keep one of them.',
  ),
  text(
    'a quote never closed',
    file('M1,AFT,1,12.5,,,,,,,', 'M1,AFT,2,12.5,,,,,,,"see note', 'M1,DON,1,300,,,,,,,'),
    `Line 3: a cell opens with a quotation mark that is never closed: ""see note". ${QUOTING}`,
  ),
  text(
    'text after a closing quote',
    file('M1,AFT,1,12.5,,,,,,,"column "A" was used"'),
    `Line 2: a cell in quotation marks has text after its closing mark: ""column "A" was used"". ${QUOTING}`,
  ),
  text(
    'an inch sign that swallows lines',
    file('M1,AFT,1,12.5,,,,,,,"', 'M1,AFT,2,12.5,,,,,,,"fine"'),
    `Line 2: a cell in quotation marks has text after its closing mark on line 3: """. ${QUOTING}`,
  ),
  text(
    'a row too short',
    file('M1,AFT,1,12.5', 'M1,AFT,2,13.5,,,,,,,'),
    'Line 2: found 4 cells where the header has 11. Write one cell for each column, empty ones too.',
  ),
  text(
    'a decimal comma between commas',
    'item,measurand,result\nM1,AFT,12,5\n',
    'Line 2: found 4 cells where the header has 3. Write one cell for each column, empty ones too. A decimal comma or a ' +
      'comma in a comment needs quotation marks around the cell.',
  ),
  text(
    'a row too long after a line break in quotes',
    'item;measurand;result;comment\nM1;AFT;12.5;"one\ntwo"\nM1;DON;300;;;\n',
    'Line 4: found 6 cells where the header has 4. Write one cell for each column, empty ones too.',
  ),
  text(
    'a line without end',
    `item,measurand,result\nM1,AFT,${'9'.repeat(200_000)}\n`,
    'Line 2: the line has 200,007 characters. A line has at most 200,000; each result stands on a line of its own.',
  ),
  text(
    'a huge cell',
    resultFile('12.5', `,,,,,,,${'x'.repeat(2001)}`),
    'Line 2, comment: the cell has 2,001 characters. A cell has at most 2,000.',
  ),
  text(
    'too many rows',
    `item,measurand,result\n${'M1,AFT,1\n'.repeat(200_000)}`,
    'The file has more than 100,000 rows. At most 100,000 rows are taken. Divide the file.',
  ),
  text(
    'too many lines',
    `item,measurand,result\n${'\n'.repeat(500_001)}M1,AFT,1\n`,
    'The file has more than 500,000 lines. At most 500,000 lines are taken. Divide the file.',
  ),
];

const found = (cell: string, words: string) => `found "${cell}". ${words}`;

const badResults: CarelessFile[] = [
  result('"12,5 ug/kg"', found('12,5 ug/kg', GENERAL)),
  result('12.5 ug/kg', found('12.5 ug/kg', GENERAL)),
  result('12.5\u00a0ug/kg', found('12.5[U+00A0]ug/kg', GENERAL)),
  result('TRUE', found('TRUE', GENERAL)),
  result('NaN', found('NaN', `Only finite numbers are taken. ${GENERAL}`)),
  result('Infinity', found('Infinity', `Only finite numbers are taken. ${GENERAL}`)),
  result('-inf', found('-inf', `Only finite numbers are taken. ${GENERAL}`)),
  result('1e999', found('1e999', 'The number is too large or too small to be kept.')),
  result('1e-999', found('1e-999', 'The number is too large or too small to be kept.')),
  result('1e99999999', found('1e99999999', 'The number is too large or too small to be kept.')),
  result('0x1F', found('0x1F', 'Write it in decimal digits.')),
  result('=1+1', 'found a formula, "=1+1". Write the value that it gives.'),
  result('"=SUM(A1,A2)"', 'found a formula, "=SUM(A1,A2)". Write the value that it gives.'),
  result("'=1+1", 'found a formula, "=1+1". Write the value that it gives.'),
  result('+A1', 'found a formula, "+A1". Write the value that it gives.'),
  result('-2+3', 'found a formula, "-2+3". Write the value that it gives.'),
  result('@SUM(A1)', 'found a formula, "@SUM(A1)". Write the value that it gives.'),
  result('#VALUE!', 'found "#VALUE!", an error value of a spreadsheet. Write the value itself.'),
  result('#N/A', 'found "#N/A", an error value of a spreadsheet. Write the value itself.'),
  result(
    '#####',
    'found "#####", which a spreadsheet shows when the column is too narrow. Widen the column and save again.',
  ),
  ...['12.05.2026', '2026-05-12', '12/05', '12-May', 'Mai 26'].map((cell) =>
    result(
      cell,
      `found "${cell}", which looks like a date. A spreadsheet may have changed the number: format the column as text or number.`,
    ),
  ),
  ...[
    ['"1,234.5"', '1,234.5'],
    ['"1,234,567"', '1,234,567'],
    ['1.234.567', '1.234.567'],
    ['1 234', '1 234'],
    ['1\u00a0234.5', '1[U+00A0]234.5'],
    ["1'234", "1'234"],
    ['<1 234', '<1 234'],
  ].map(([cell = '', shown = '']) =>
    result(
      cell,
      `found "${shown}", which has a mark between thousands. Write the digits without it, such as 1234.5 or, in a file ` +
        'with decimal commas, 1234,5.',
    ),
  ),
  result(
    '"1,234"',
    'found "1,234", which could be 1.234 or 1234. Write numbers with a decimal point and no mark between thousands, or put semicolons between the cells.',
  ),
  result(
    '\u20130.3',
    'found "\u20130.3", which begins with a dash that is no minus sign. Write a hyphen before a negative number.',
  ),
  result(
    '1.2 x 10^-3',
    found('1.2 x 10^-3', 'Write a power of ten as 1.2e-3 or, in a file with decimal commas, 1,2e-3.'),
  ),
  result(
    '12.5 \u00b1 0.3',
    found('12.5 \u00b1 0.3', `The uncertainty belongs in the column expanded_uncertainty. ${GENERAL}`),
  ),
  result('0.5%', found('0.5%', `A percent sign is a unit. ${GENERAL}`)),
  result("'12.5", found("'12.5", 'Leave out the apostrophe.')),
  result(
    'n.d.',
    found(
      'n.d.',
      `Write <LOQ with the limit in the column loq, or the limit itself, such as <2.0. ${REASON}`,
    ),
  ),
  result(
    '<LOD',
    found(
      '<LOD',
      `Write <LOQ with the limit in the column loq, or the limit itself, such as <2.0. ${REASON}`,
    ),
  ),
  result(
    '-',
    found('-', `Write <LOQ with the limit in the column loq, or the limit itself, such as <2.0. ${REASON}`),
  ),
  result(
    '<LOQ',
    'found "<LOQ", but the column loq has nothing in this row. Give the limit of quantification there, or write the limit itself, such as <2.0.',
  ),
  result('>LOQ', found('>LOQ', 'Write the limit itself, such as >300.')),
  result('<=2.0', found('<=2.0', 'Write <2.0 or >300, without "or equal".')),
  result('\u22652.0', found('\u22652.0', 'Write <2.0 or >300, without "or equal".')),
  result('<0', found('<0', 'A limit is above 0, such as <2.0.')),
  result('<-1', found('<-1', 'A limit is above 0, such as <2.0.')),
  result('<', found('<', GENERAL)),
  result(
    '',
    'found an empty cell and no reason. Write the result or, when there is none, the reason in the column comment.',
  ),
  result('12.5\u202e3', found('12.5[U+202E]3', GENERAL)),
];

const badDecimals: CarelessFile[] = [
  text(
    'a file that mixes decimal marks',
    'item;measurand;replicate;result\nM1;AFT;1;12.5\nM1;AFT;2;13\nM1;DON;1;300,5\nM2;DON;1;1.5\n',
    'Line 4, result: found "300,5" with a decimal comma, but line 2, result, has "12.5" with a decimal point. Use one ' +
      'decimal mark in the whole file, and no mark between thousands.',
  ),
  text(
    'a row that mixes decimal marks',
    'item;measurand;result;loq\nM1;AFT;12,5;0.5\n',
    'Line 2, loq: found "0.5" with a decimal point, but line 2, result, has "12,5" with a decimal comma. Use one decimal ' +
      'mark in the whole file, and no mark between thousands.',
  ),
  text(
    'a number with a unit in a file with decimal commas',
    'item;measurand;result\nM1;AFT;12,5\nM1;DON;300 ug/kg\n',
    'Line 3, result: found "300 ug/kg". Write a number such as 12,5 or <2,0 or >300 or <LOQ; the unit belongs in the column unit.',
  ),
];

const badCells: CarelessFile[] = [
  text('an unknown item', file('M9,AFT,1,12.5,,,,,,,'), 'Line 2, item: found "M9". The plan has M1 and M2.'),
  text(
    'an unknown measurand',
    file('M1,ZEA,1,12.5,,,,,,,'),
    'Line 2, measurand: found "ZEA". The plan has AFT and DON.',
  ),
  text(
    'a measurand of another item',
    file('M2,AFT,1,12.5,,,,,,,'),
    'Line 2, measurand: found "AFT", which the plan does not ask for in item M2. There it asks for DON.',
  ),
  text(
    'no item and no measurand',
    file(',,1,12.5,,,,,,,'),
    'Line 2, item: found an empty cell. The plan has M1 and M2.',
    'Line 2, measurand: found an empty cell. The plan has AFT and DON.',
  ),
  text(
    'a replicate too many',
    file('M1,AFT,3,12.5,,,,,,,'),
    'Line 2, replicate: found "3". Write a whole number from 1 to 2.',
  ),
  text(
    'half a replicate',
    file('M1,AFT,1.0,12.5,,,,,,,'),
    'Line 2, replicate: found "1.0". Write a whole number from 1 to 2.',
  ),
  text(
    'a replicate where one is asked for',
    file('M1,DON,2,300,,,,,,,'),
    'Line 2, replicate: found "2". The plan asks for one result here: write 1 or leave the cell empty.',
  ),
  text(
    'a row twice',
    file('M1,AFT,1,12.5,,,,,,,', 'M1,DON,1,300,,,,,,,', 'm1,aft,,12.7,,,,,,,'),
    'Line 4: M1, AFT, replicate 1, stands on line 2 already. Keep one of the two rows, or number the replicates from 1 to 2.',
  ),
  text(
    'a single result twice',
    file('M1,DON,1,300,,,,,,,', 'M1,DON,1,300,,,,,,,'),
    'Line 3: M1, DON, replicate 1, stands on line 2 already. Keep one of the two rows.',
  ),
  text(
    'capitals in a unit',
    resultFile('12.5', ',UG/KG,,,,,,'),
    'Line 2, unit: found "UG/KG". Write "ug/kg" if that is meant. The plan asks for ug/kg.',
  ),
  text(
    'a megagram',
    resultFile('12.5', ',Mg/kg,,,,,,'),
    'Line 2, unit: found "Mg/kg". Write "mg/kg" if that is meant. The plan asks for ug/kg.',
  ),
  text(
    'ppb without brackets',
    resultFile('12.5', ',ppb,,,,,,'),
    'Line 2, unit: found "ppb". Write "[ppb]" if that is meant. The plan asks for ug/kg.',
  ),
  text(
    'an unknown unit',
    resultFile('12.5', ',ppt,,,,,,'),
    'Line 2, unit: found "ppt". Write a UCUM code: ug/kg or a unit that converts to it, such as mg/kg.',
  ),
  text(
    'a concentration for a mass fraction',
    resultFile('12.5', ',ug/L,,,,,,'),
    'Line 2, unit: found "ug/L". The plan asks for ug/kg; a mass concentration does not convert to a mass fraction without a density.',
  ),
  text(
    'a uncertainty of 0',
    resultFile('12.5', ',,0,,,,,'),
    'Line 2, expanded_uncertainty: found "0". Write a number above 0, such as 0.8, in the unit of the result.',
  ),
  text(
    'an uncertainty in percent',
    resultFile('12.5', ',,5 %,,,,,'),
    'Line 2, expanded_uncertainty: found "5 %". A percent sign is a unit. Write a number above 0, such as 0.8, in the unit of the result.',
  ),
  text(
    'a coverage factor in the wrong column',
    resultFile('12.5', ',,2,0.8,,,,'),
    'Line 2, coverage_factor: found "0.8". Write a number from 1 to 10, such as 2.',
  ),
  text(
    'a negative LOQ',
    resultFile('<LOQ', ',,,,-2,,,'),
    'Line 2, result: found "<LOQ", but the column loq has no usable number in this row. Give the limit of quantification there, or write the limit itself, such as <2.0.',
    'Line 2, loq: found "-2". Write a number above 0, such as 2.0, in the unit of the result.',
  ),
  text(
    'an unknown method',
    resultFile('12.5', ',,,,,HPLC,,'),
    'Line 2, method: found "HPLC". The method sheets are IAC-1 and LC-2.',
  ),
  text(
    'a date in another order',
    resultFile('12.5', ',,,,,,30.11.2026,'),
    `Line 2, analysed_on: found "30.11.2026". ${DATE_WORDS}, without a time.`,
  ),
  text(
    'a date with a time',
    resultFile('12.5', ',,,,,,2026-11-30T10:00,'),
    `Line 2, analysed_on: found "2026-11-30T10:00". ${DATE_WORDS}, without a time.`,
  ),
  text(
    'a day that is not',
    resultFile('12.5', ',,,,,,2026-02-29,'),
    `Line 2, analysed_on: found "2026-02-29". No calendar has that day. ${DATE_WORDS}.`,
  ),
  text(
    'a day number',
    resultFile('12.5', ',,,,,,46356,'),
    `Line 2, analysed_on: found "46356". It looks like a day number of a spreadsheet. ${DATE_WORDS}.`,
  ),
  text(
    'tomorrow',
    resultFile('12.5', ',,,,,,2026-12-02,'),
    'Line 2, analysed_on: found "2026-12-02". Write a date that is not after today, 2026-12-01.',
  ),
  text(
    'a long comment',
    resultFile('12.5', `,,,,,,,${'x'.repeat(501)}`),
    'Line 2, comment: the comment has 501 characters. At most 500 are kept.',
  ),
  text(
    'a number that converting takes out of range',
    resultFile('1e305', ',g/g,,,,,,'),
    'Line 2, result: found "1e305". In the plan\'s unit the number is too large or too small to be kept.',
  ),
  bytes(
    'a unit in another code page',
    windows1252(resultFile('12.5', ',\u00e6g/kg,,,,,,')),
    'Line 2, unit: found "\u00e6g/kg". Write a UCUM code: ug/kg or a unit that converts to it, such as mg/kg.',
  ),
];

export const CARELESS_FILES: readonly CarelessFile[] = [
  ...notCsv,
  ...badText,
  ...badShape,
  ...badResults,
  ...badDecimals,
  ...badCells,
];
