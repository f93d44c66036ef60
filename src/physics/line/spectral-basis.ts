import { evenBesselJ } from '../../numerics/bessel.js';
import { gaussLegendre } from '../../numerics/gauss-legendre.js';

/**
 * Strip currents expanded with the condition at the edge built in, transformed across the strip, on the nodes of one
 * quadrature over the wavenumber ky from 0 to `end`:
 *   along:  Chebyshev polynomials T(2n) over sqrt(1 − (2y/w)²), transform J(2n)(ky w/2); n = 0 carries the whole current;
 *   across: sqrt(1 − (2y/w)²) times U(2m−1), transform J(2m)(ky w/2)/(ky w/2), m ≥ 1.
 * Sources: T. Itoh and R. Mittra, IEEE Trans. Microwave Theory Tech. 22(10), 1974; R. H. Jansen, ibid. 33(10), 1985.
 */
export interface SpectralBasis {
  readonly halfWidth: number;
  readonly along: number;
  readonly across: number;
  readonly nodes: Float64Array;
  readonly weights: Float64Array;
  /** J(2n)(ky w/2), row n. */
  readonly bessel: readonly Float64Array[];
  /** ∫₀^∞ J(2n) J(2m) (1 − e^{−ky·reach})/ky dky, row n: what remains of every kernel far out. */
  readonly far: readonly Float64Array[];
  readonly reach: number;
}

const NODES_PER_PANEL = 8;
/** Kernels have reached their far form within e^{−2·10} of the slab and e^{−2·6} of a thin coat here. */
const END = 10;
const END_OF_COAT = 6;

/**
 * @param width    of the strip, m
 * @param height   of the slab, m
 * @param thinnest of slab and coat, m
 * @param terms    functions along; one less across
 */
export function spectralBasis(width: number, height: number, thinnest: number, terms: number): SpectralBasis {
  const a = width / 2;
  const end = Math.max(END / height, END_OF_COAT / thinnest);
  const panels = Math.ceil(end / Math.min(1 / height, 2.5 / a));
  const rule = gaussLegendre(NODES_PER_PANEL);
  const count = panels * NODES_PER_PANEL;
  const nodes = new Float64Array(count);
  const weights = new Float64Array(count);
  const half = end / panels / 2;
  for (let p = 0; p < panels; p++)
    for (let i = 0; i < NODES_PER_PANEL; i++) {
      nodes[p * NODES_PER_PANEL + i] = half * (2 * p + 1 + rule.nodes[i]);
      weights[p * NODES_PER_PANEL + i] = half * rule.weights[i];
    }
  const bessel = Array.from({ length: terms }, () => new Float64Array(count));
  const orders = new Float64Array(terms);
  for (let i = 0; i < count; i++) {
    evenBesselJ(nodes[i] * a, orders);
    for (let n = 0; n < terms; n++) bessel[n][i] = orders[n];
  }
  const reach = 2 * height;
  const far = bessel.map((row, n) =>
    Float64Array.from(bessel, (column, m) => {
      // Weber and Schafheitlin: ∫ J(2n) J(2m)/x dx is 1/(4n) on the diagonal and 0 off it; for n = m = 0 the logarithmic
      // potential of the Maxwell distribution, ⟨ln |y − y'|⟩ = ln(w/4), takes its place.
      let sum = n !== m ? 0 : n > 0 ? 1 / (4 * n) : Math.log((2 * reach) / a);
      const one = n === 0 && m === 0 ? 1 : 0;
      for (let i = 0; i < count; i++)
        sum += (weights[i] * Math.exp(-nodes[i] * reach) * (one - row[i] * column[i])) / nodes[i];
      return sum;
    }),
  );
  return { halfWidth: a, along: terms, across: terms - 1, nodes, weights, bessel, far, reach };
}
