/** Checks of cuts, directivity and tapers against values of antenna texts. */
import { cutShape, farFieldPower } from '../physics/pattern/index.js';
import { taperAmplitudes } from '../physics/taper/index.js';
import type { EvidenceCheck } from './check.js';
import { isotropicRow } from './isotropic-row.js';

const TOPIC = 'Arrays and tapers';
const DEG = 180 / Math.PI;

/** Row of equally spaced elements in phase, `spacing` wavelengths apart. */
const rowCut = (amplitudes: readonly number[], spacing = 0.5) =>
  cutShape(isotropicRow(amplitudes, spacing).cut('elevation'), 3601);
const uniform = (n: number): number[] => taperAmplitudes({ kind: 'uniform' }, n);
const dolph = (n: number, sidelobeDb: number): number[] => taperAmplitudes({ kind: 'dolph-chebyshev', sidelobeDb }, n);
/** As if the elements radiated downwards too. */
function directivity(amplitudes: readonly number[], spacing = 0.5): number {
  const field = isotropicRow(amplitudes, spacing);
  return (2 * Math.PI * field.cut('elevation')(0)) / farFieldPower(field);
}

/** An aperture taper over places from −1 to 1, by 100 elements of half a wavelength: 50 wavelengths long. */
const aperture = (taper: (place: number) => number): number[] =>
  Array.from({ length: 100 }, (_, i) => taper((i - 49.5) / 50));
const APERTURES = 'Stutzman and Thiele, Antenna Theory and Design, 2012, table of line sources';

interface Row {
  readonly id: string;
  readonly quantity: string;
  readonly source: string;
  readonly expected: number;
  readonly unit: string;
  readonly tolerance: number;
  readonly toleranceReason: string;
  readonly compute: () => number;
}

const rows: readonly Row[] = [
  {
    id: 'uniform-beamwidth',
    quantity: 'half-power beamwidth of ten uniform elements at λ/2',
    source: 'array factor, any antenna text (Balanis, Antenna Theory, 2016, ch. 6)',
    expected: 10.209,
    unit: '°',
    tolerance: 0.0006,
    toleranceReason: 'the three decimals given',
    compute: () => rowCut(uniform(10)).halfPowerBeamwidth * DEG,
  },
  {
    id: 'uniform-sidelobe',
    quantity: 'sidelobe level of ten uniform elements at λ/2',
    source: 'array factor, any antenna text (Balanis, Antenna Theory, 2016, ch. 6)',
    expected: -12.966,
    unit: 'dB',
    tolerance: 0.001,
    toleranceReason: 'the three decimals given, parabola through close samples',
    compute: () => rowCut(uniform(10)).sidelobeDb,
  },
  {
    id: 'uniform-sidelobe-8',
    quantity: 'sidelobe level of eight uniform elements',
    source: 'array factor, any antenna text (Balanis, Antenna Theory, 2016, ch. 6)',
    expected: -12.8,
    unit: 'dB',
    tolerance: 0.05,
    toleranceReason: 'the one decimal given',
    compute: () => rowCut(uniform(8)).sidelobeDb,
  },
  {
    id: 'uniform-sidelobe-limit',
    quantity: 'sidelobe level of many uniform elements',
    source: 'limit of the uniform line source, any antenna text',
    expected: -13.26,
    unit: 'dB',
    tolerance: 0.008,
    toleranceReason: 'the two decimals given; 100 elements are within 0.003 dB of the limit',
    compute: () => rowCut(uniform(100)).sidelobeDb,
  },
  {
    id: 'uniform-beamwidth-limit',
    quantity: 'half-power beamwidth of many uniform elements, in λ/(Nd)',
    source: 'limit of the uniform line source, any antenna text',
    expected: 0.886,
    unit: '1',
    tolerance: 0.0006,
    toleranceReason: 'the three decimals given',
    compute: () => rowCut(uniform(100)).halfPowerBeamwidth * 50,
  },
  {
    id: 'uniform-directivity',
    quantity: 'directivity of eight isotropic elements at λ/2, by integration',
    source: 'exact: N at half a wavelength (Balanis, Antenna Theory, 2016, ch. 6)',
    expected: 8,
    unit: '1',
    tolerance: 0.001,
    toleranceReason: 'the integration is good to 1e-4',
    compute: () => directivity(uniform(8)),
  },
  ...(
    [
      ['triangular', (p: number) => 1 - Math.abs(p), -26.6, 0.1, 1.28],
      ['cosine', (p: number) => Math.cos((Math.PI * p) / 2), -23, 0.1, 1.19],
      ['cosine-squared', (p: number) => Math.cos((Math.PI * p) / 2) ** 2, -31.5, 0.1, 1.44],
    ] as const
  ).flatMap(([id, taper, levelDb, levelTolerance, width]): Row[] => [
    {
      id: `${id}-sidelobe`,
      quantity: `sidelobe level of the ${id} line source`,
      source: APERTURES,
      expected: levelDb,
      unit: 'dB',
      tolerance: levelTolerance,
      toleranceReason: 'one decimal given, and texts differ by one in the last place',
      compute: () => rowCut(aperture(taper)).sidelobeDb,
    },
    {
      id: `${id}-beamwidth`,
      quantity: `half-power beamwidth of the ${id} line source, in λ/L`,
      source: APERTURES,
      expected: width,
      unit: '1',
      tolerance: 0.006,
      toleranceReason: 'the two decimals given',
      compute: () => rowCut(aperture(taper)).halfPowerBeamwidth * 50,
    },
  ]),
  {
    id: 'chebyshev-beamwidth',
    quantity: 'half-power beamwidth of the 26 dB Dolph–Chebyshev array of ten at λ/2',
    source: 'Dolph 1946; Balanis, Antenna Theory, 2016, example 6.9 (26 dB, ten elements)',
    expected: 12.346,
    unit: '°',
    tolerance: 0.0006,
    toleranceReason: 'the three decimals given',
    compute: () => rowCut(dolph(10, 26)).halfPowerBeamwidth * DEG,
  },
  {
    id: 'chebyshev-sidelobe',
    quantity: 'sidelobe level of that array',
    source: 'Dolph 1946; Balanis, Antenna Theory, 2016, example 6.9 (26 dB, ten elements)',
    expected: -26,
    unit: 'dB',
    tolerance: 0.001,
    toleranceReason: 'the level asked for is exact',
    compute: () => rowCut(dolph(10, 26)).sidelobeDb,
  },
];

export const arrayPatternChecks: readonly EvidenceCheck[] = rows.map(({ id, ...row }) => ({
  id: `cut.${id}`,
  topic: TOPIC,
  howKnown: 'memory',
  ...row,
}));
