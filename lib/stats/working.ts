export type WorkingInput = number | string | null | readonly number[];

/** One row of an iteration, in the unit of the data. Every row of a step has the same keys. */
export type WorkingIteration = Readonly<Record<string, number>>;

/**
 * One step of a computation as a reader can redo it by hand.
 *
 * `formula` is plain text whose right-hand side uses the names of `inputs` with + - * / ^ sqrt and abs, so that
 * it can be worked out from what is printed; words are used where arithmetic would not be readable.
 */
export interface WorkingStep {
  readonly name: string;
  readonly formula: string;
  readonly clause: string;
  readonly inputs: Readonly<Record<string, WorkingInput>>;
  readonly value: number | string | null;
  readonly iterations?: readonly WorkingIteration[];
}
