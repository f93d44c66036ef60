import {
  GAUSSIAN_ALPHA,
  gaussianMeanLine,
  type HeightMap,
  mapParameters,
  normalRange,
  type Profile,
  profileParameters,
} from '../physics/texture/index.js';
import type { EvidenceCheck } from './check.js';

const TOPIC = 'Surface texture';
const UM = 1e-6;
/** Points of ten whole periods of 10 µm. */
const POINTS = 2000;
const SPACING = 0.05 * UM;

const profile = (f: (turns: number) => number): Profile => ({
  spacing: SPACING,
  heights: Float64Array.from({ length: POINTS }, (_, i) => UM * f((i + 0.5) / 200)),
});
const sine = () => profileParameters(profile((turns) => Math.sin(2 * Math.PI * turns)));
const triangle = () => profileParameters(profile((turns) => 4 * Math.abs((turns % 1) - 0.5) - 1));

function grooves(): HeightMap {
  // Four periods and the six points that the slope formula leaves out.
  const [columns, rows] = [406, 32];
  const heights = Float64Array.from(
    { length: columns * rows },
    (_, i) => UM * Math.sin((2 * Math.PI * (i % columns)) / 100),
  );
  return { columns, rows, spacingX: 0.1 * UM, spacingY: 0.1 * UM, heights };
}

/** Share of a sine that the middle of a long profile keeps in the mean line. */
function kept(wavelengthOverIndex: number): number {
  const middle = 2000;
  const wave = 10 * UM * wavelengthOverIndex;
  const heights = Float64Array.from({ length: 2 * middle + 1 }, (_, i) =>
    Math.cos((2 * Math.PI * (i - middle) * SPACING) / wave),
  );
  return gaussianMeanLine({ spacing: SPACING, heights }, 10 * UM).heights[middle];
}

const definition = {
  topic: TOPIC,
  source: 'definitions of ISO 21920-2:2021, integrals of the wave by hand',
  howKnown: 'memory',
  toleranceReason: 'sampled at 200 points a period: below 1e-4 of the amplitude',
} as const;
const filter = {
  topic: TOPIC,
  source: 'ISO 16610-21:2011, exp(−π(α index/λ)²) with α = sqrt(ln 2/π)',
  howKnown: 'memory',
  unit: '1',
} as const;

const transmission = (wavelengthOverIndex: number, expected: number): EvidenceCheck => ({
  ...filter,
  id: `texture.gaussian-${wavelengthOverIndex}`,
  quantity: `share of a sine of ${wavelengthOverIndex} nesting indices that the Gaussian filter keeps in the mean line`,
  expected,
  tolerance: 1e-6,
  toleranceReason: 'six decimals printed; the profile is sampled at 100 points a period or more',
  compute: () => kept(wavelengthOverIndex),
});

export const textureChecks: readonly EvidenceCheck[] = [
  {
    ...definition,
    id: 'texture.sine-ra',
    quantity: 'Ra of a sine of amplitude 1 µm, 2A/π',
    expected: 0.63662,
    unit: 'µm',
    tolerance: 1e-4,
    compute: () => sine().ra / UM,
  },
  {
    ...definition,
    id: 'texture.sine-rq',
    quantity: 'Rq of a sine of amplitude 1 µm, A/√2',
    expected: Math.SQRT1_2,
    unit: 'µm',
    tolerance: 1e-5,
    toleranceReason: 'tabulated to five decimals',
    compute: () => sine().rq / UM,
  },
  {
    ...definition,
    id: 'texture.triangle-rq',
    quantity: 'Rq of a triangle of amplitude 1 µm, A/√3',
    expected: 0.57735,
    unit: 'µm',
    tolerance: 1e-4,
    compute: () => triangle().rq / UM,
  },
  {
    ...definition,
    id: 'texture.triangle-rku',
    quantity: 'Rku of a triangle, 9/5',
    expected: 1.8,
    unit: '1',
    tolerance: 1e-3,
    compute: () => triangle().rku,
  },
  {
    topic: TOPIC,
    id: 'texture.sine-sdr',
    quantity: 'Sdr of a one-directional sine, 1 µm on 10 µm',
    source: 'definition of ISO 25178-2; complete elliptic integral, computed separately',
    howKnown: 'memory',
    expected: 9.2384,
    unit: '%',
    tolerance: 1e-4,
    toleranceReason: 'four decimals kept',
    compute: () => 100 * mapParameters(grooves()).sdr,
  },
  {
    ...filter,
    id: 'texture.gaussian-alpha',
    quantity: 'constant α of the Gaussian filter',
    expected: 0.4697,
    tolerance: 5e-5,
    toleranceReason: 'four printed digits',
    compute: () => GAUSSIAN_ALPHA,
  },
  transmission(0.5, 0.0625),
  transmission(1, 0.5),
  transmission(2, 0.840896),
  {
    topic: TOPIC,
    id: 'texture.normal-range',
    quantity: 'mean range of 25 normal heights over their standard deviation (behind Rz to Rq)',
    source: 'L. H. C. Tippett, Biometrika 17, 1925; factor d2 of control charts, ISO 7870-2',
    howKnown: 'memory',
    expected: 3.931,
    unit: '1',
    tolerance: 5e-4,
    toleranceReason: 'three printed decimals',
    compute: () => normalRange(25),
  },
];
