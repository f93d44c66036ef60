import { type RectangularGuide, rectangularGuide } from '../physics/line/index.js';
import { ANNEALED_COPPER_CONDUCTIVITY, halfSpaceImpedance } from '../physics/material/index.js';
import type { EvidenceCheck } from './check.js';

const TOPIC = 'Rectangular waveguide';
const DB_PER_NEPER = 20 / Math.LN10;

function copperGuide(width: number, height: number, permittivity: number, lossTangent: number, frequency: number) {
  const wall = halfSpaceImpedance(frequency, ANNEALED_COPPER_CONDUCTIVITY);
  return rectangularGuide({
    width,
    height,
    permittivity,
    lossTangent,
    frequency,
    walls: { top: wall, bottom: wall, left: wall, right: wall },
  });
}

const conductorLoss = (guide: RectangularGuide): number => {
  const { top, bottom, left, right } = guide.conductorLoss;
  return top + bottom + left + right;
};

const filled = () => copperGuide(10.7e-3, 4.3e-3, 2.08, 0.0004, 15e9);
const wr12 = () => copperGuide(3.0988e-3, 1.5494e-3, 1, 0, 77e9);

const pozar = {
  topic: TOPIC,
  source: 'D. M. Pozar, Microwave Engineering, 4th ed., 2012, Example 3.1',
  howKnown: 'memory',
} as const;
const filledWords = 'guide 10.7 × 4.3 mm filled with permittivity 2.08, loss tangent 0.0004, 15 GHz';

export const guideChecks: readonly EvidenceCheck[] = [
  {
    ...pozar,
    id: 'guide.filled-cutoff',
    quantity: `${filledWords}: cut-off`,
    expected: 9.72,
    unit: 'GHz',
    tolerance: 0.01,
    toleranceReason: 'the textbook rounds the speed of light to 3e8 m/s',
    compute: () => filled().cutoff * 1e-9,
  },
  {
    ...pozar,
    id: 'guide.filled-beta',
    quantity: `${filledWords}: phase constant`,
    expected: 345.1,
    unit: '1/m',
    tolerance: 0.5,
    toleranceReason: 'the textbook rounds the speed of light to 3e8 m/s',
    compute: () => filled().beta,
  },
  {
    ...pozar,
    id: 'guide.filled-dielectric-loss',
    quantity: `${filledWords}: dielectric loss`,
    expected: 0.119,
    unit: 'Np/m',
    tolerance: 5e-4,
    toleranceReason: 'three printed decimals',
    compute: () => filled().dielectricLoss,
  },
  {
    ...pozar,
    id: 'guide.filled-conductor-loss',
    quantity: `${filledWords}: conductor loss`,
    expected: 0.05,
    unit: 'Np/m',
    tolerance: 5e-4,
    toleranceReason: 'three printed decimals',
    compute: () => conductorLoss(filled()),
  },
  {
    id: 'guide.wr12-cutoff',
    topic: TOPIC,
    quantity: 'air-filled WR-12: cut-off',
    source: 'EIA WR-12, 3.0988 × 1.5494 mm; c/2a computed separately',
    howKnown: 'memory',
    expected: 48.372,
    unit: 'GHz',
    tolerance: 5e-4,
    toleranceReason: 'three decimals kept',
    compute: () => wr12().cutoff * 1e-9,
  },
  {
    id: 'guide.wr12-loss',
    topic: TOPIC,
    quantity: 'air-filled WR-12 of smooth copper, 77 GHz: conductor loss',
    source: 'field integrals over the walls, made for this project; formula of Pozar 2012, eq. (3.96)',
    howKnown: 'independent solution',
    expected: 1.9311,
    unit: 'dB/m',
    tolerance: 1e-4,
    toleranceReason: 'four decimals kept',
    compute: () => conductorLoss(wr12()) * DB_PER_NEPER,
  },
];
