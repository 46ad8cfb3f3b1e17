import { describe, expect, it } from 'vitest';
import { readResultsFile } from '@/lib/results-file';
import { CARELESS_FILES } from './careless-files';
import { PLAN, TODAY } from './fixtures';

describe('a careless or hostile file is refused in words', () => {
  for (const { name, bytes, messages } of CARELESS_FILES) {
    it(name, () => {
      const copy = bytes.slice();
      const read = readResultsFile(bytes, PLAN, { kind: 'laboratory', today: TODAY });
      expect(read.problems.map(({ message }) => message)).toEqual(messages);
      expect(read.ok).toBe(false);
      expect(Buffer.compare(bytes, copy), 'the bytes are left as they were').toBe(0);
    });
  }

  it('has at least 60 of them, each with a name of its own', () => {
    expect(new Set(CARELESS_FILES.map(({ name }) => name)).size).toBeGreaterThanOrEqual(60);
  });

  it('says place, found and expected apart as well', () => {
    const bytes = new TextEncoder().encode('item,measurand,result\nM1,AFT,"12,5 ug/kg"\n');
    const [problem] = readResultsFile(bytes, PLAN, { kind: 'laboratory', today: TODAY }).problems;
    expect(problem).toMatchObject({ code: 'not-a-number', line: 2, column: 'result', found: '12,5 ug/kg' });
    expect(problem?.message).toBe(`Line 2, result: found "12,5 ug/kg". ${problem?.expected}`);
  });
});
