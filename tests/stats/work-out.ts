import type { WorkingStep } from '@/lib/stats';

/** Arithmetic on lists element by element, on a number and a list, or on two numbers. */
type Amount = number | readonly number[];

function both(a: Amount, b: Amount, apply: (x: number, y: number) => number): Amount {
  if (typeof a === 'number') return typeof b === 'number' ? apply(a, b) : b.map((y) => apply(a, y));
  if (typeof b === 'number') return a.map((x) => apply(x, b));
  return a.map((x, i) => apply(x, b[i] as number));
}

const sum = (list: readonly number[]) => list.reduce((total, value) => total + value, 0);
const products = (x: readonly number[], y: readonly number[]) => {
  const [mx, my] = [sum(x) / x.length, sum(y) / y.length];
  return sum(x.map((value, i) => (value - mx) * ((y[i] as number) - my)));
};

const FUNCTIONS: Readonly<Record<string, (...args: Amount[]) => Amount>> = {
  sqrt: (x) => both(x as Amount, 0, (a) => Math.sqrt(a)),
  abs: (x) => both(x as Amount, 0, (a) => Math.abs(a)),
  sum: (x) => sum([x as Amount].flat()),
  squares: (x) => products(x as readonly number[], x as readonly number[]),
  products: (x, y) => products(x as readonly number[], y as readonly number[]),
  max: (...args) => Math.max(...(args.flat() as number[])),
  min: (...args) => Math.min(...(args.flat() as number[])),
};

const OPERATORS: Readonly<Record<string, { rank: number; apply: (x: number, y: number) => number }>> = {
  '+': { rank: 1, apply: (x, y) => x + y },
  '-': { rank: 1, apply: (x, y) => x - y },
  '*': { rank: 2, apply: (x, y) => x * y },
  '/': { rank: 2, apply: (x, y) => x / y },
  '^': { rank: 3, apply: (x, y) => x ** y },
};

/**
 * Works out the right-hand side of a printed formula from the printed inputs, as a reader with a calculator would.
 * A name that stands for a list is used element by element; sum, squares (about the mean), products, max and min
 * make a number of it.
 */
export function workOut({ formula, inputs }: Pick<WorkingStep, 'formula' | 'inputs'>): number {
  const tokens = formula.slice(formula.indexOf('=') + 1).match(/\d+(\.\d+)?(e-?\d+)?|[A-Za-z_]\w*|\S/g) ?? [];
  let at = 0;
  const next = () => tokens[at++] ?? '';
  const operand = (): Amount => {
    const token = next();
    if (token === '(') {
      const inner = expression(1);
      next();
      return inner;
    }
    if (/^\d/.test(token)) return Number(token);
    if (tokens[at] === '(' && token in FUNCTIONS) return call(token);
    const value = inputs[token];
    if (typeof value !== 'number' && !Array.isArray(value)) throw new Error(`${formula}: no input ${token}`);
    return value as Amount;
  };
  const call = (name: string): Amount => {
    next();
    const args = [expression(1)];
    while (tokens[at] === ',') {
      next();
      args.push(expression(1));
    }
    next();
    return (FUNCTIONS[name] as (...args: Amount[]) => Amount)(...args);
  };
  const expression = (rank: number): Amount => {
    let left = operand();
    for (
      let found = OPERATORS[tokens[at] ?? ''];
      found && found.rank >= rank;
      found = OPERATORS[tokens[at] ?? '']
    ) {
      next();
      left = both(left, expression(found.rank + 1), found.apply);
    }
    return left;
  };
  const result = expression(1);
  // What follows in words, such as "(s_d2 is below s_r^2)", is not part of the arithmetic.
  return typeof result === 'number' ? result : NaN;
}
