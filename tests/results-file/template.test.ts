import { expect, test } from 'vitest';
import { readResultsFile, wholeRoundTemplate, type ResultsPlan } from '@/lib/results-file';

const PLAN: ResultsPlan = {
  round: 'Example',
  items: [{ code: 'M1', name: 'Maize' }],
  measurands: [
    { roundMeasurandId: 7, item: 'M1', measurand: 'AFT', name: 'Aflatoxins', unit: 'ug/kg', replicates: 2 },
  ],
  methods: null,
  laboratories: [
    { id: 1, name: 'North mill' },
    { id: 2, name: 'South, harbour' },
  ],
};

test('the template of a whole round has the rows of the plan for each laboratory and reads back when filled', () => {
  const text = wholeRoundTemplate(PLAN);
  const lines = text.trim().split('\r\n');
  expect(lines).toHaveLength(5);
  expect(lines[3]).toBe('"South, harbour",M1,AFT,1,,ug/kg,,,,,,');
  const filled = text.replaceAll(/(M1,AFT,\d),,/g, '$1,12.5,');
  const read = readResultsFile(new TextEncoder().encode(filled), PLAN, {
    kind: 'whole-round',
    today: '2026-12-01',
  });
  expect(read.problems).toEqual([]);
  expect(read.results.map((row) => [row.laboratoryId, row.replicate, row.limitOrValue])).toEqual([
    [1, 1, 12.5],
    [1, 2, 12.5],
    [2, 1, 12.5],
    [2, 2, 12.5],
  ]);
});

test('without laboratories it has the rows once, with the laboratory left open', () => {
  expect(
    wholeRoundTemplate({ ...PLAN, laboratories: [] })
      .trim()
      .split('\r\n'),
  ).toHaveLength(3);
});
