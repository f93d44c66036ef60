import { ANNEALED_COPPER_CONDUCTIVITY } from '../physics/material/index.js';
import { gradient, gradientPlaneShift, groiss, hammerstad, roughFace } from '../physics/roughness/index.js';
import { type EvidenceCheck, INDEPENDENT_EDDY } from './check.js';

const TOPIC = 'Rough copper';
const PRINTED = 'half a unit of the last digit kept';

const ratio = (r: number): string => `Rq/δ = ${r}`;

function gradientAt(r: number, k: number, x: number): EvidenceCheck[] {
  const common = {
    topic: TOPIC,
    source: `${INDEPENDENT_EDDY}; normal conductivity profile solved two ways to 1e-10`,
    howKnown: 'independent solution',
    unit: '1',
    toleranceReason: PRINTED,
  } as const;
  return [
    {
      ...common,
      id: `roughness.gradient-loss-${r}`,
      quantity: `gradient model, loss factor at ${ratio(r)}`,
      expected: k,
      tolerance: 5e-5,
      compute: () => gradient(r, 1).re,
    },
    {
      ...common,
      id: `roughness.gradient-reactance-${r}`,
      quantity: `gradient model, reactance over Rs to the mean plane at ${ratio(r)}`,
      expected: x,
      tolerance: 5e-5,
      compute: () => gradient(r, 1).im,
    },
  ];
}

/** RMS height of a symmetric triangular profile is its depth over 2√3. */
const triangleRq = (depth: number): number => depth / (2 * Math.sqrt(3));

function triangles(depth: number, solved: number): EvidenceCheck {
  return {
    id: `roughness.hammerstad-triangles-${depth}`,
    topic: TOPIC,
    quantity: `Hammerstad against 60° triangular grooves across the current, ${depth} skin depths deep`,
    source: `${INDEPENDENT_EDDY}; the shape of S. P. Morgan, J. Appl. Phys. 20, 1949`,
    howKnown: 'independent solution',
    expected: solved,
    unit: '1',
    tolerance: 0.05 * solved,
    toleranceReason: '5 %: the formula is a fit, drawn through computed grooves by hand',
    compute: () => hammerstad(triangleRq(depth), 1).factor,
  };
}

function foil(rqMicrometres: number, k: number, x: number): EvidenceCheck[] {
  const face = () =>
    roughFace('gradient', {
      rq: rqMicrometres * 1e-6,
      frequency: 77e9,
      conductivity: ANNEALED_COPPER_CONDUCTIVITY,
      permittivity: 3,
    });
  const common = {
    topic: TOPIC,
    source: INDEPENDENT_EDDY,
    howKnown: 'independent solution',
    unit: '1',
    toleranceReason: 'rel. 1e-4: five digits kept, rounded inputs',
  } as const;
  return [
    {
      ...common,
      id: `roughness.foil-loss-${rqMicrometres}`,
      quantity: `gradient model at 77 GHz, Rq ${rqMicrometres} µm: loss factor`,
      expected: k,
      tolerance: 1e-4 * k,
      compute: () => face().lossFactor,
    },
    {
      ...common,
      id: `roughness.foil-reactance-${rqMicrometres}`,
      quantity: `gradient model at 77 GHz, Rq ${rqMicrometres} µm: reactance over Rs`,
      expected: x,
      tolerance: 1e-4 * Math.abs(x),
      compute: () => face().reactance,
    },
  ];
}

export const roughnessChecks: readonly EvidenceCheck[] = [
  {
    id: 'roughness.hammerstad-1',
    topic: TOPIC,
    quantity: `Hammerstad loss factor at ${ratio(1)}`,
    source: 'E. Hammerstad and Ø. Jensen, IEEE MTT-S Digest 1980, pp. 407–409',
    howKnown: 'memory',
    expected: 1.605,
    unit: '1',
    tolerance: 5e-4,
    toleranceReason: 'three printed decimals',
    compute: () => hammerstad(1, 1).factor,
  },
  triangles(1, 1.08),
  triangles(4, 1.655),
  triangles(8, 1.832),
  ...[
    [0.3, 1.1039],
    [1, 1.719],
    [3, 1.9447],
  ].map(
    ([r, k]): EvidenceCheck => ({
      id: `roughness.groiss-${r}`,
      topic: TOPIC,
      quantity: `Groiss loss factor at ${ratio(r as number)}`,
      source: 'S. Groiss et al., IEEE Trans. Magn. 32(3), 1996; value computed separately from the formula',
      howKnown: 'memory',
      expected: k as number,
      unit: '1',
      tolerance: 5e-5,
      toleranceReason: PRINTED,
      compute: () => groiss(r as number, 1).factor,
    }),
  ),
  ...gradientAt(0.3, 1.1403, 0.82262),
  ...gradientAt(1, 1.8633, -0.65814),
  ...gradientAt(3, 3.9277, -8.0898),
  ...foil(0.4, 2.5916, -2.8476),
  ...foil(1, 5.0779, -13.514),
  {
    id: 'roughness.gradient-plane',
    topic: TOPIC,
    quantity: 'gradient model, electrostatic plane above the mean plane over Rq (copper under permittivity 3, 77 GHz)',
    source: `${INDEPENDENT_EDDY}; quantile of the normal distribution`,
    howKnown: 'independent solution',
    expected: 5.05,
    unit: '1',
    tolerance: 0.005,
    toleranceReason: 'two decimals kept',
    compute: () => gradientPlaneShift(1, 77e9, ANNEALED_COPPER_CONDUCTIVITY, 3),
  },
];
