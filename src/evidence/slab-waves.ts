/** Checks of the grounded slab: its guided wave, and how a dipole on it shares its power. */
import { complex } from '../numerics/complex.js';
import { type FarField, tm0Wavenumber } from '../physics/column/index.js';
import { SPEED_OF_LIGHT } from '../physics/constants.js';
import { currentTransfers } from '../physics/full-wave/slab-field.js';
import type { SlabMedium } from '../physics/full-wave/slab-medium.js';
import { guidedPower } from '../physics/full-wave/slab-wave.js';
import { farFieldPower } from '../physics/pattern/index.js';
import { type EvidenceCheck, INDEPENDENT_FULL_WAVE } from './check.js';

const TOPIC = 'Slab and surface wave';
const FREQUENCY = 77e9;
const K0 = (2 * Math.PI * FREQUENCY) / SPEED_OF_LIGHT;

const slab = (permittivity: number, k0h: number): SlabMedium => ({
  permittivity,
  lossTangent: 0,
  height: k0h / K0,
  groundImpedance: complex(0),
});

/** Radiated power of a dipole of 1 A m along x on the slab, W. */
function dipoleRadiates(medium: SlabMedium): number {
  const transfer = currentTransfers(medium, FREQUENCY);
  const field: FarField = {
    frequency: FREQUENCY,
    extent: { x: 0, y: 0 },
    at(u, v, out) {
      const sin2 = u * u + v * v;
      out.fill(0);
      if (sin2 >= 1) return;
      const { tm, te } = transfer(sin2);
      const sine = Math.sqrt(sin2);
      const [c, s] = sine === 0 ? [1, 0] : [u / sine, v / sine];
      out[0] = c * tm.re;
      out[1] = c * tm.im;
      out[2] = -s * te.re;
      out[3] = -s * te.im;
    },
    cut: () => () => Number.NaN,
  };
  return farFieldPower(field);
}

const dipoleGuides = (medium: SlabMedium): number =>
  guidedPower(
    medium,
    FREQUENCY,
    (_kx, _ky, out) => {
      out.fill(0);
      out[0] = 1;
    },
    0,
  );

const THIN = 0.004;
const JACKSON =
  'D. R. Jackson and N. G. Alexopoulos, IEEE Trans. Antennas Propag. 39(3), 1991: thin-slab limits of a horizontal dipole';
/** Of the radiated power: 1 − 1/n² + (2/5)/n⁴. */
const c1 = (er: number): number => 1 - 1 / er + 0.4 / (er * er);

export const slabWaveChecks: readonly EvidenceCheck[] = [
  ...(
    [
      [100, 1.0059],
      [127, 1.0096],
      [254, 1.0422],
    ] as const
  ).map(
    ([height, index]): EvidenceCheck => ({
      id: `slab.tm0-index-${height}`,
      topic: TOPIC,
      quantity: `index of the TM0 surface wave at 77 GHz, ${height} µm of permittivity 3.0`,
      source: INDEPENDENT_FULL_WAVE,
      howKnown: 'independent solution',
      expected: index,
      unit: '1',
      tolerance: 6e-5,
      toleranceReason: 'the four decimals given',
      compute: () => tm0Wavenumber(K0, 3, height * 1e-6) / K0,
    }),
  ),
  ...[1, 2.2, 3, 10.2].flatMap((er): EvidenceCheck[] => {
    const shared = {
      topic: TOPIC,
      source: JACKSON,
      howKnown: 'memory',
      unit: '1',
      toleranceReason: `limit of no thickness, approached in proportion to k0h, here ${THIN}: a few times as much`,
    } as const;
    const radiated: EvidenceCheck = {
      ...shared,
      id: `slab.dipole-radiates-${er}`,
      quantity: `radiated power of a horizontal dipole on a thin slab of permittivity ${er}, in 80π²(k0h Il/λ)²`,
      expected: c1(er),
      tolerance: 4 * THIN * c1(er),
      compute: () => dipoleRadiates(slab(er, THIN)) / (80 * Math.PI ** 2 * (THIN * (K0 / (2 * Math.PI))) ** 2),
    };
    if (er < 2) return [radiated];
    const share: EvidenceCheck = {
      ...shared,
      id: `slab.dipole-share-${er}`,
      quantity: `surface-wave over radiated power of a horizontal dipole on a thin slab of permittivity ${er}, in k0h`,
      expected: (0.75 * Math.PI * (1 - 1 / er) ** 3) / c1(er),
      tolerance: (4 * THIN * 0.75 * Math.PI * (1 - 1 / er) ** 3) / c1(er),
      compute: () => dipoleGuides(slab(er, THIN)) / dipoleRadiates(slab(er, THIN)) / THIN,
    };
    return [radiated, share];
  }),
];
