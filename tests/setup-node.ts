import fc from 'fast-check';
import { afterEach, expect, vi } from 'vitest';

/** A fixed seed, so that a check fails for a change and not for a draw; another one is set by ASSIZE_TEST_SEED. */
const DEFAULT_SEED = 20261201;
fc.configureGlobal({ seed: Number(process.env.ASSIZE_TEST_SEED ?? DEFAULT_SEED) });

const complaints: unknown[][] = [];
vi.spyOn(console, 'error').mockImplementation((...args) => void complaints.push(args));
vi.spyOn(console, 'warn').mockImplementation((...args) => void complaints.push(args));

afterEach(() => {
  const seen = complaints.splice(0);
  expect(seen, 'unexpected console.error or console.warn').toEqual([]);
});
