import { expect } from 'vitest';
import type { WorkingStep } from '@/lib/stats';
import { expectClose } from './expect-close';
import { workOut } from './work-out';

interface Redoing {
  readonly rtol?: number;
  readonly atol?: number;
  /** Steps said in words, worked out by the test itself. */
  readonly inWords?: Readonly<Record<string, (step: WorkingStep) => number>>;
}

/** Fails unless the value of every step follows from its printed formula and inputs. Gives the number of steps redone. */
export function expectRedone(steps: readonly WorkingStep[] | null, options: Redoing = {}): number {
  const { rtol = 1e-10, atol = 1e-12, inWords = {} } = options;
  expect(steps?.length, 'steps').toBeGreaterThan(0);
  let redone = 0;
  for (const step of steps ?? []) {
    expect(step.clause.length, step.name).toBeGreaterThan(5);
    if (typeof step.value !== 'number') continue;
    const compute = inWords[step.name] ?? workOut;
    expectClose(compute(step), step.value, { rtol, atol });
    redone += 1;
  }
  return redone;
}
