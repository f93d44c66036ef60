/** Nodes in (−1, 1), ascending, and weights of the n-point Gauss–Legendre rule; exact for polynomials to degree 2n − 1. */
export interface QuadratureRule {
  readonly nodes: Float64Array;
  readonly weights: Float64Array;
}

const rules = new Map<number, QuadratureRule>();

/** Newton's method on the Legendre polynomial from Tricomi's first guess; kept, since the same few orders recur. */
export function gaussLegendre(n: number): QuadratureRule {
  const known = rules.get(n);
  if (known) return known;
  if (!Number.isInteger(n) || n < 1) throw new RangeError(`gaussLegendre: order ${n}, a whole number from 1 is needed`);
  const nodes = new Float64Array(n);
  const weights = new Float64Array(n);
  for (let i = 0; i < Math.ceil(n / 2); i++) {
    let x = Math.cos((Math.PI * (i + 0.75)) / (n + 0.5));
    let derivative = 1;
    for (let iteration = 0; iteration < 100; iteration++) {
      let [previous, current] = [1, x];
      for (let k = 2; k <= n; k++)
        [previous, current] = [current, ((2 * k - 1) * x * current - (k - 1) * previous) / k];
      derivative = (n * (x * current - previous)) / (x * x - 1);
      const step = current / derivative;
      x -= step;
      if (Math.abs(step) < 1e-16) break;
    }
    if (n % 2 === 1 && i === (n - 1) / 2) x = 0;
    const weight = 2 / ((1 - x * x) * derivative * derivative);
    nodes[i] = -x;
    nodes[n - 1 - i] = x;
    weights[i] = weight;
    weights[n - 1 - i] = weight;
  }
  const rule = { nodes, weights };
  rules.set(n, rule);
  return rule;
}
