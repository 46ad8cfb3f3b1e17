import fc from 'fast-check';
import { expect, it } from 'vitest';
import { COLUMNS, readResultsFile, writeCsv, type DecimalMark, type Separator } from '@/lib/results-file';
import { numberFromDecimal } from '@/lib/units';
import { join, PLAN, TODAY, utf16, utf8, windows1252 } from './fixtures';

const PLACES = PLAN.measurands.flatMap((measurand) =>
  Array.from({ length: measurand.replicates }, (_, index) => ({ ...measurand, replicate: index + 1 })),
);
/** Each unit with the power of ten that leads to ug/kg. */
const UNITS = [
  ['', null],
  ['ug/kg', 0],
  ['\u00b5g/kg', 0],
  ['mg/kg', 3],
  ['[ppm]', 3],
  ['ng/kg', -3],
] as const;

const digits = (max: number) => fc.integer({ min: 1, max }).map(String);
/** Decimal text above 0 that no one takes for thousands. */
const positive = fc
  .tuple(fc.integer({ min: 0, max: 99_999 }), digits(99), fc.constantFrom('', 'e-3', 'E+2'))
  .map(([whole, fraction, exponent]) => `${whole}.${fraction}${exponent}`);
const optional = <T>(value: fc.Arbitrary<T>) => fc.option(value, { nil: null });
/** Windows-1252 can write all of these; cells are trimmed, so none begins or ends with white space. */
const comment = fc
  .string({ unit: fc.constantFrom(...'aZ0 ,;\t"\'=+-@\n\u00e9\u00df'), maxLength: 60 })
  .map((text) => `x${text}x`);
const cause = fc.constantFrom('=', '+', '@', "'=", '');

const row = fc.record({
  sign: fc.constantFrom('', '', '-', '<', '>'),
  amount: optional(positive),
  unit: fc.constantFrom(...UNITS),
  uncertainty: optional(positive),
  factor: optional(fc.constantFrom('1.5', '2', '3.25')),
  loq: optional(positive),
  method: optional(fc.constantFrom('IAC-1', 'LC-2')),
  date: optional(fc.constantFrom('2026-11-30', '2024-02-29', TODAY)),
  comment: fc.tuple(cause, comment).map(([start, text]) => start + text),
});

const ENCODERS = {
  'UTF-8': utf8,
  'UTF-8 marked': (text: string) => join([0xef, 0xbb, 0xbf], text),
  'UTF-16LE': (text: string) => utf16(text, 'LE', false),
  'UTF-16BE': (text: string) => utf16(text, 'BE', true),
  'Windows-1252': windows1252,
};

const shape = fc.record({
  rows: fc.array(row, { minLength: 1, maxLength: PLACES.length }),
  order: fc.shuffledSubarray([...COLUMNS.filter((name) => name !== 'laboratory')], { minLength: 11 }),
  separator: fc.constantFrom<Separator>(',', ';', '\t'),
  mark: fc.constantFrom<DecimalMark>('.', ','),
  end: fc.constantFrom('\n', '\r\n', '\r'),
  encoding: fc.constantFrom(...(Object.keys(ENCODERS) as (keyof typeof ENCODERS)[])),
});

it('any valid results, in any separator, decimal mark, line end and encoding, read back the same', () => {
  fc.assert(
    fc.property(shape, ({ rows, order, separator, mark, end, encoding }) => {
      const marked = (text: string | null) => (mark === ',' ? (text?.replace('.', ',') ?? null) : text);
      const written = rows.map((given, index) => {
        const place = PLACES[index];
        if (place === undefined) throw new Error('more rows than places');
        const resultText = given.amount === null ? '' : given.sign + (marked(given.amount) ?? '');
        return { given, place, resultText };
      });
      const cells = written.map(({ given, place, resultText }) => ({
        item: place.item,
        measurand: place.measurand,
        replicate: place.replicate,
        result: resultText,
        unit: given.unit[0],
        expanded_uncertainty: marked(given.uncertainty),
        coverage_factor: marked(given.factor),
        loq: marked(given.loq),
        method: given.method,
        analysed_on: given.date,
        comment: given.comment,
      }));
      const bytes = ENCODERS[encoding](writeCsv(cells, order, { separator }).replaceAll('\r\n', end));
      const read = readResultsFile(bytes, PLAN, { kind: 'laboratory', today: TODAY });
      expect(read.problems).toEqual([]);
      const expected = written.map(({ given, place, resultText }) => {
        const shift = given.unit[1] === null ? 0 : given.unit[1] - (place.unit === 'mg/kg' ? 3 : 0);
        const own = (text: string | null) => (text === null ? null : numberFromDecimal(text));
        const planned = (text: string | null) => (text === null ? null : numberFromDecimal(text, shift));
        const amount = given.amount === null ? null : (given.sign === '-' ? '-' : '') + given.amount;
        const kinds = { '': 'value', '-': 'value', '<': 'below', '>': 'above' } as const;
        return {
          roundMeasurandId: place.roundMeasurandId,
          item: place.item,
          measurand: place.measurand,
          replicate: place.replicate,
          resultText,
          kind: given.amount === null ? 'not-measured' : kinds[given.sign as keyof typeof kinds],
          limitOrValue: planned(amount),
          valueInOwnUnit: own(amount),
          unitText: given.unit[0] === '' ? null : given.unit[0],
          unit: place.unit,
          expandedUncertaintyText: marked(given.uncertainty),
          expandedUncertaintyInOwnUnit: own(given.uncertainty),
          expandedUncertainty: planned(given.uncertainty),
          coverageFactor: given.uncertainty === null ? null : Number(given.factor ?? '2'),
          loqText: marked(given.loq),
          loq: planned(given.loq),
          method: given.method,
          analysedOn: given.date,
          comment: given.comment,
          laboratory: null,
          laboratoryId: null,
        };
      });
      expect(read.results.map(({ line: _line, ...rest }) => rest)).toEqual(expected);
    }),
    { seed: 20261201, numRuns: 500 },
  );
});

it('any bytes at all are answered, never thrown at', () => {
  fc.assert(
    fc.property(fc.uint8Array({ maxLength: 300 }), fc.boolean(), (tail, hasHeader) => {
      const bytes = hasHeader ? join('item,measurand,result,loq,comment\nM1,AFT,', [...tail]) : tail;
      const read = readResultsFile(bytes, PLAN, { kind: 'laboratory', today: TODAY });
      expect(read.ok).toBe(read.problems.length === 0);
      expect(read.ok && read.results.length === 0).toBe(false);
    }),
    { seed: 20261201, numRuns: 1000 },
  );
});
