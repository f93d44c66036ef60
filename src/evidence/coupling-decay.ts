/** Checks of how coupling between two patches falls with distance on a thin slab. */
import { type ColumnGeometry, edgeNetwork } from '../physics/column/index.js';
import { SPEED_OF_LIGHT } from '../physics/constants.js';
import type { EvidenceCheck } from './check.js';
import { sheetFaces } from './engine-problems.js';

const FREQUENCY = 77e9;
const WAVELENGTH = SPEED_OF_LIGHT / FREQUENCY;
const PATCH = { width: 1e-3, length: 1.05e-3 };
/** So thin that the surface wave takes next to nothing. */
const HEIGHT = 25e-6;

/** Coupling in dB of two edge-fed patches whose centres are so many wavelengths apart; in the E plane the feeds point away. */
function coupling(plane: 'E' | 'H', wavelengths: number): number {
  const apart = wavelengths * WAVELENGTH;
  const patch = { y: 0, feedLineWidth: 0.13e-3, patches: [PATCH], links: [] };
  const columns: ColumnGeometry[] = [
    { ...patch, x: 0 },
    plane === 'E' ? { ...patch, x: apart + PATCH.length, direction: -1 } : { ...patch, x: 0, y: apart },
  ];
  const s = edgeNetwork(
    {
      slab: { permittivity: 3.16, lossTangent: 0, height: HEIGHT },
      stripThickness: 0,
      referenceImpedance: 'line',
      columns,
    },
    FREQUENCY,
  ).solve({ frequency: FREQUENCY, faces: sheetFaces('none', FREQUENCY) }).scattering[1][0];
  return 20 * Math.log10(Math.hypot(s.re, s.im));
}

const check = (plane: 'E' | 'H', expected: number, tolerance: number, toleranceReason: string): EvidenceCheck => ({
  id: `coupling.${plane.toLowerCase()}-plane-decay`,
  topic: 'Coupling of patches',
  quantity: `fall of coupling from 2 to 4 wavelengths in the ${plane} plane, ${HEIGHT * 1e6} µm of permittivity 3.16`,
  source:
    'far from a magnetic current on a ground plane: field as 1/r in the E plane, 1/r² in the H plane; the difference as measured by R. P. Jedlicka, M. T. Poe and K. R. Carver, IEEE Trans. Antennas Propag. 29(1), 1981',
  howKnown: 'memory',
  expected,
  unit: 'dB',
  tolerance,
  toleranceReason,
  compute: () => coupling(plane, 2) - coupling(plane, 4),
});

export const couplingDecayChecks: readonly EvidenceCheck[] = [
  check('E', 6.02, 0.6, 'the surface wave falls by 3 dB and is some tenth of the field on this slab'),
  check('H', 12.04, 0.3, 'terms of 1/r³ and the surface wave, each some hundredths of the field at two wavelengths'),
];
