export type Inputs = Readonly<Record<string, readonly number[]>>;
export type Figures = Readonly<Record<string, number | null>>;
export type Ours = (inputs: Inputs) => Figures;

export function one(inputs: Inputs, name: string): number {
  const value = inputs[name]?.[0];
  if (value === undefined) throw new Error(`the case has no ${name}`);
  return value;
}

export function many(inputs: Inputs, name: string): readonly number[] {
  const values = inputs[name];
  if (!values) throw new Error(`the case has no ${name}`);
  return values;
}
