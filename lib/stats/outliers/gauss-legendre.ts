export interface GaussLegendre {
  readonly nodes: Float64Array;
  readonly weights: Float64Array;
}

/** Nodes and weights of Gauss-Legendre quadrature on (-1, 1), by Newton's method on the Legendre polynomial. */
export function gaussLegendre(n: number): GaussLegendre {
  const nodes = new Float64Array(n);
  const weights = new Float64Array(n);
  for (let i = 0; i < n; i += 1) {
    let x = Math.cos((Math.PI * (i + 0.75)) / (n + 0.5));
    let slope = 1;
    for (let step = 0; step < 20; step += 1) {
      let [before, value] = [1, x];
      for (let k = 2; k <= n; k += 1)
        [before, value] = [value, ((2 * k - 1) * x * value - (k - 1) * before) / k];
      slope = (n * (x * value - before)) / (x * x - 1);
      x -= value / slope;
      if (Math.abs(value / slope) < 1e-15) break;
    }
    nodes[i] = x;
    weights[i] = 2 / ((1 - x * x) * slope * slope);
  }
  return { nodes, weights };
}
