import { gaussLegendre } from '../../numerics/gauss-legendre.js';
import { normalCdf } from '../../numerics/normal.js';

/** Height parameters that a data sheet may give in place of Rq. */
export type HeightParameter = 'Rq' | 'Sq' | 'Ra' | 'Sa' | 'Rz' | 'Sz';

/** Rq over the parameter: what is taken, and the least and most that real textures show. */
export interface RqConversion {
  readonly factor: number;
  readonly low: number;
  readonly high: number;
  /** The distribution of heights and the reason for the spread, in a sentence; absent for Rq itself. */
  readonly assumption?: string;
}

/** Rq/Ra of normal heights, of a sine, and of heights whose density falls as exp(−|z|) on both sides. */
export const RQ_OVER_RA = { normal: Math.sqrt(Math.PI / 2), sine: Math.PI / (2 * Math.SQRT2), laplace: Math.SQRT2 };

/**
 * Mean range (largest less smallest) of n independent normal heights over their standard deviation,
 * ∫ [1 − Φⁿ − (1 − Φ)ⁿ] dx. L. H. C. Tippett, Biometrika 17, 1925.
 *
 * @param n how many, from 2 to 1e9
 * @throws RangeError outside that
 */
export function normalRange(n: number): number {
  if (!(n >= 2 && n <= 1e9)) throw new RangeError(`a number of heights from 2 to 1e9 is needed, got ${n}`);
  const { nodes, weights } = gaussLegendre(16);
  const panels = 32;
  const half = 8 / panels;
  let sum = 0;
  for (let p = 0; p < panels; p++)
    for (let i = 0; i < nodes.length; i++) {
      // Even integrand: from 0 to 8, twice.
      const x = half * (2 * p + 1 + nodes[i]) * 0.5;
      const tail = normalCdf(-x);
      sum += weights[i] * (-Math.expm1(n * Math.log1p(-tail)) - tail ** n);
    }
  return sum * half;
}

/**
 * Rz over Rq that is taken where only one of them is measured: the mean range of some 200 independent normal heights.
 * Measured foils scatter from about 4 to 8; a quarter of Rq on both sides covers sections with 45 (4.4) to some 4500 (7.3)
 * heights.
 */
export const ASSUMED_RZ_OVER_RQ = 5.5;
const SPREAD_OF_RZ = 0.25;

const fromMean = (other: string): RqConversion => ({
  factor: RQ_OVER_RA.normal,
  low: RQ_OVER_RA.sine,
  high: RQ_OVER_RA.laplace,
  assumption: `Rq is 1.2533 times the stated ${other}: heights are assumed to have a normal distribution${other === 'Sa' ? ', and Sq to equal Rq' : ''}; 1.11 (a sine) to 1.41 (heights that fall off exponentially) is allowed for.`,
});

const fromRange = (other: string): RqConversion => ({
  factor: 1 / ASSUMED_RZ_OVER_RQ,
  low: (1 - SPREAD_OF_RZ) / ASSUMED_RZ_OVER_RQ,
  high: (1 + SPREAD_OF_RZ) / ASSUMED_RZ_OVER_RQ,
  assumption: `Rq is the stated ${other} divided by ${ASSUMED_RZ_OVER_RQ}, an assumption (the mean range of some 200 independent normal heights); 25 % of Rq is added to its spread on both sides.${other === 'Sz' ? ' A map holds more independent heights than a section, so Sz overstates Rq this way.' : ''}`,
});

/** Rq from another height parameter of the same face and the same filters. */
export const RQ_CONVERSIONS: Readonly<Record<HeightParameter, RqConversion>> = {
  Rq: { factor: 1, low: 1, high: 1 },
  Sq: {
    factor: 1,
    low: 1,
    high: 1,
    assumption:
      'Rq is taken equal to the stated Sq: the root-mean-square height of the surface stands for that of a profile.',
  },
  Ra: fromMean('Ra'),
  Sa: fromMean('Sa'),
  Rz: fromRange('Rz'),
  Sz: fromRange('Sz'),
};
