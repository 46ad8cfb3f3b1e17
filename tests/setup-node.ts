import { afterEach, expect, vi } from 'vitest';

const complaints: unknown[][] = [];
vi.spyOn(console, 'error').mockImplementation((...args) => void complaints.push(args));
vi.spyOn(console, 'warn').mockImplementation((...args) => void complaints.push(args));

afterEach(() => {
  const seen = complaints.splice(0);
  expect(seen, 'unexpected console.error or console.warn').toEqual([]);
});
