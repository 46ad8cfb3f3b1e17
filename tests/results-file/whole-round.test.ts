import { describe, expect, it } from 'vitest';
import { readResultsFile, type ResultsPlan } from '@/lib/results-file';
import { PLAN, TODAY, utf8 } from './fixtures';

const ROUND: ResultsPlan = {
  ...PLAN,
  methods: null,
  laboratories: [
    { id: 1, name: 'Lower Mill', code: 'LM' },
    { id: 2, name: 'Dairy on the Weir' },
  ],
};

function read(content: string) {
  return readResultsFile(utf8(content), ROUND, { kind: 'whole-round', today: TODAY });
}

describe('a whole round', () => {
  it('finds laboratories by name or code and lists new ones once', () => {
    const checked = read(
      'laboratory,item,measurand,result\nLower Mill,M1,AFT,12.5\nlm,M1,DON,300\nid 1,M1,AFT,13\nNorth  Silo,M1,AFT,11\n' +
        'north silo,M1,DON,290\ndairy on the weir,M1,AFT,12\n',
    );
    expect(checked.problems).toEqual([]);
    expect(checked.results.map(({ laboratory, laboratoryId }) => [laboratory, laboratoryId])).toEqual([
      ['Lower Mill', 1],
      ['Lower Mill', 1],
      ['id 1', null],
      ['North  Silo', null],
      ['North  Silo', null],
      ['Dairy on the Weir', 2],
    ]);
    expect(checked.newLaboratories).toEqual(['id 1', 'North  Silo']);
    expect(checked.notices.map(({ message }) => message)).toEqual([
      'M1, AFT: the file has 4 of the 8 results that the plan asks for of 4 laboratories.',
      'M1, DON: the file has 2 of the 4 results that the plan asks for of 4 laboratories.',
      'M2, DON: the file has none of the 4 results that the plan asks for of 4 laboratories.',
      'Column laboratory: 2 laboratories are not known yet and will be new: "id 1" and "North  Silo".',
    ]);
  });

  it('takes the same result of two laboratories, and of one only once', () => {
    const rows = ['Lower Mill,M1,DON,300', 'Dairy on the Weir,M1,DON,310', 'LM,M1,DON,305'];
    expect(
      read(`laboratory,item,measurand,result\n${rows.join('\n')}`).problems.map(({ message }) => message),
    ).toEqual([
      'Line 4: Lower Mill, M1, DON, replicate 1, stands on line 2 already. Keep one of the two rows.',
    ]);
  });

  it('needs the column and a name in every row', () => {
    expect(read('item,measurand,result\nM1,AFT,12.5\n').problems[0]?.message).toContain(
      'Line 1: the required column laboratory is missing; found "item", "measurand", "result". ',
    );
    expect(read('laboratory,item,measurand,result\n,M1,AFT,12.5\n').problems[0]?.message).toBe(
      'Line 2, laboratory: found an empty cell. Write the name or the code of the laboratory.',
    );
  });

  it('holds every row to the same rules', () => {
    expect(read('laboratory,item,measurand,result\nLM,M1,AFT,=1+1\n').problems[0]?.message).toBe(
      'Line 2, result: found a formula, "=1+1". Write the value that it gives.',
    );
  });
});
