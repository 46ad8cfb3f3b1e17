import { expect, test } from 'vitest';
import { atMoment, timestamp } from '@/db/clock';

test('rows are stamped with the moment told inside and with the present outside', async () => {
  const inside = await atMoment('2024-02-29T08:30:00Z', async () => {
    await new Promise((resolve) => setTimeout(resolve, 1));
    return timestamp();
  });
  expect(inside).toBe('2024-02-29T08:30:00.000Z');
  expect(Math.abs(Date.parse(timestamp()) - Date.now())).toBeLessThan(1_000);
});

test('an unreadable moment is refused', () => {
  expect(() => atMoment('yesterday', async () => 1)).toThrow(RangeError);
});
