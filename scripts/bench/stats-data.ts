import { uniformFloat64 } from 'pure-rand/distribution/uniformFloat64';
import { xoroshiro128plus } from 'pure-rand/generator/xoroshiro128plus';

export interface BenchData {
  readonly n: number;
  readonly x: readonly number[];
  readonly y: readonly number[];
  /** Of the kernel density, the same for both sides. */
  readonly bandwidth: number;
}

/** One in twenty results is far out. */
const WILD = 0.05;
const SPREAD = 3;

/** Invented results of two methods, the same on every machine: x about 50, y = 1 + 1.02 x with scatter. */
export function makeData(n: number): BenchData {
  const generator = xoroshiro128plus(20261201 + n);
  const uniform = () => uniformFloat64(generator);
  const normal = () => Math.sqrt(-2 * Math.log(1 - uniform())) * Math.cos(2 * Math.PI * uniform());
  const x = Array.from({ length: n }, () => 50 + SPREAD * normal());
  const y = x.map((value) => 1 + 1.02 * value + normal() * (uniform() < WILD ? 20 : 1));
  return { n, x, y, bandwidth: (0.9 * SPREAD) / n ** 0.2 };
}
