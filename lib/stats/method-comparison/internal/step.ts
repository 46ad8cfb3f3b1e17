import type { WorkingInput, WorkingStep } from '../../working';

/**
 * One step of a working. In formulas of this topic sum(...), median(...), count(...) and max(...) run over lists, and
 * arithmetic with a list is done entry by entry; all else is as WorkingStep says.
 */
export function step(
  name: string,
  formula: string,
  clause: string,
  inputs: Readonly<Record<string, WorkingInput>>,
  value: number | string | null,
): WorkingStep {
  return { name, formula, clause, inputs, value };
}
