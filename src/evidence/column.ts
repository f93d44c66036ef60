/** Checks of the column engine, its far field and the cut figures. */
import { type Complex, complex } from '../numerics/complex.js';
import { arrayFigures } from '../physics/array/index.js';
import { type ColumnProblem, edgeNetwork, tm0Wavenumber } from '../physics/column/index.js';
import { SPEED_OF_LIGHT } from '../physics/constants.js';
import { surfaceResistance } from '../physics/material/index.js';
import { cutShape } from '../physics/pattern/index.js';
import { type EvidenceCheck, INDEPENDENT_FULL_WAVE, once } from './check.js';
import { COLUMN_REFERENCES, type ColumnReference } from './column-references.js';

const MPIE =
  'independent full-wave solutions of the columns (mixed-potential integral equation), made for this project, not measured';
const DEG = 180 / Math.PI;

function sheet(copper: 'none' | 'smooth' | 'rough', frequency: number) {
  const rs = surfaceResistance(frequency, 5.8e7);
  const z = { none: complex(0), smooth: complex(rs, rs), rough: complex(2 * rs, 3 * rs) }[copper];
  return { underside: z, top: z, edges: z, ground: z };
}

function columnProblem(reference: ColumnReference): ColumnProblem {
  return {
    slab: { permittivity: reference.permittivity, lossTangent: reference.lossTangent, height: reference.height },
    stripThickness: 0,
    referenceImpedance: 'line',
    columns: [
      {
        x: 0,
        y: 0,
        feedLineWidth: reference.lineWidthMm * 1e-3,
        patches: [...reference.linkLengthsMm, 0].map(() => ({
          width: reference.patchWidthMm * 1e-3,
          length: reference.patchLengthMm * 1e-3,
        })),
        links: reference.linkLengthsMm.map((length) => ({
          width: reference.lineWidthMm * 1e-3,
          length: length * 1e-3,
        })),
      },
    ],
  };
}

interface Difference {
  readonly reflection: number;
  readonly reflectionDb: number;
  readonly directivityDb: number;
  readonly gainDb: number;
  readonly tiltDeg: number;
  readonly sidelobeDb: number;
}

/** Network less reference at each row of a column. */
function differences(reference: ColumnReference, copper: 'smooth' | 'rough'): Difference[] {
  const engine = edgeNetwork(columnProblem(reference), 81e9);
  return reference.rows
    .filter((row) => row.copper === copper)
    .map((row) => {
      const frequency = row.fGHz * 1e9;
      const solution = engine.solve({ frequency, faces: sheet(copper, frequency) });
      const figures = arrayFigures(solution, [complex(1)]);
      const s: Complex = figures.passiveReflection[0];
      const directivityDb = 10 * Math.log10(figures.directivity);
      return {
        reflection: Math.hypot(s.re - row.s11[0], s.im - row.s11[1]),
        reflectionDb: 20 * Math.log10(Math.hypot(row.s11[0], row.s11[1])),
        directivityDb: directivityDb - row.directivityDbi,
        gainDb: directivityDb + 10 * Math.log10(figures.radiationEfficiency) - row.gainDbi,
        tiltDeg: figures.elevation.beamDirection * DEG - row.tiltDeg,
        sidelobeDb: figures.elevation.sidelobeDb - row.sidelobeDb,
      };
    });
}

const rms = (values: readonly number[]): number => Math.sqrt(values.reduce((s, v) => s + v * v, 0) / values.length);

function columnChecks(reference: ColumnReference, copper: 'smooth' | 'rough'): EvidenceCheck[] {
  const where = `${reference.name}, ${copper} copper, 76 to 80 GHz`;
  const slug = `${Math.round(reference.height * 1e6)}-${copper}`;
  const found = once(() => differences(reference, copper));
  const check = (
    id: string,
    quantity: string,
    unit: string,
    tolerance: number,
    toleranceReason: string,
    of: (d: readonly Difference[]) => number,
  ): EvidenceCheck => ({
    id: `column.${id}-${slug}`,
    topic: 'Patch columns: network against full wave',
    quantity: `${quantity}, ${where}`,
    source: MPIE,
    howKnown: 'independent solution',
    expected: 0,
    unit,
    tolerance,
    toleranceReason,
    compute: () => of(found()),
  });
  return [
    check(
      'reflection',
      'rms difference of complex reflection',
      '1',
      0.1,
      'the accuracy of column reflections that uncertainties are built on',
      (d) => rms(d.map((x) => x.reflection)),
    ),
    check(
      'directivity',
      'rms difference of directivity',
      'dB',
      0.25,
      '0.2 dB of the network and 0.1 dB of the reference, root of sum of squares',
      (d) => rms(d.map((x) => x.directivityDb)),
    ),
    check(
      'gain',
      'mean difference of gain where reflection is below −5 dB',
      'dB',
      0.4,
      '0.35 dB, the accuracy that uncertainties are built on, and 0.1 dB of the reference',
      (d) => {
        const kept = d.filter((x) => x.reflectionDb < -5);
        return kept.reduce((sum, x) => sum + x.gainDb, 0) / kept.length;
      },
    ),
    check(
      'tilt',
      'rms difference of beam direction',
      '°',
      0.55,
      '0.5° of the network and 0.15° from the 0.5° grid of the reference',
      (d) => rms(d.map((x) => x.tiltDeg)),
    ),
    check(
      'sidelobe',
      'rms difference of the elevation sidelobe level',
      'dB',
      1.1,
      '1 dB of the network and 0.5 dB of the reference above −20 dB',
      (d) => rms(d.map((x) => x.sidelobeDb)),
    ),
  ];
}

/** Edge-fed single patches: frequency at which the input resistance peaks. */
const patches = [
  {
    name: '1.25 mm wide on 127 µm, permittivity 3.0',
    er: 3.0,
    h: 127e-6,
    L: 1.013e-3,
    W: 1.25e-3,
    line: 0.17241e-3,
    f0: 78.529,
  },
  {
    name: '0.50 mm wide on 100 µm, permittivity 3.16',
    er: 3.16,
    h: 100e-6,
    L: 1.055e-3,
    W: 0.5e-3,
    line: 0.16216e-3,
    f0: 79.548,
  },
  {
    name: '1.10 mm wide on 200 µm, permittivity 3.55',
    er: 3.55,
    h: 200e-6,
    L: 0.875e-3,
    W: 1.1e-3,
    line: 0.15172e-3,
    f0: 79.777,
  },
];

function resonance(patch: (typeof patches)[number]): number {
  const engine = edgeNetwork(
    {
      slab: { permittivity: patch.er, lossTangent: 0, height: patch.h },
      stripThickness: 0,
      referenceImpedance: 'line',
      columns: [{ x: 0, y: 0, feedLineWidth: patch.line, patches: [{ width: patch.W, length: patch.L }], links: [] }],
    },
    83e9,
  );
  const resistance = (frequency: number): number => {
    const s = engine.solve({ frequency, faces: sheet('none', frequency) }).scattering[0][0];
    return (1 - s.re * s.re - s.im * s.im) / ((1 - s.re) ** 2 + s.im * s.im);
  };
  const peak = (from: number, to: number, step: number): number => {
    let [best, at] = [0, from];
    for (let frequency = from; frequency <= to; frequency += step) {
      const r = resistance(frequency);
      if (r > best) [best, at] = [r, frequency];
    }
    return at;
  };
  const near = peak(75e9, 83e9, 200e6);
  const at = peak(near - 200e6, near + 200e6, 20e6);
  return at / 1e9;
}

/** Uniform array of isotropic elements half a wavelength apart. */
const uniformArray = (count: number) => (angle: number) => {
  const half = (Math.PI / 2) * Math.sin(angle);
  return Math.abs(half) < 1e-9 ? 1 : (Math.sin(count * half) / (count * Math.sin(half))) ** 2;
};

/** Dolph–Chebyshev amplitudes of ten elements for −26 dB, from the centre outward. */
const CHEBYSHEV_10_26 = [2.769478, 2.478709, 1.967925, 1.355482, 1];
const chebyshevArray = (angle: number): number =>
  (2 * CHEBYSHEV_10_26.reduce((sum, a, i) => sum + a * Math.cos((i + 0.5) * Math.PI * Math.sin(angle)), 0)) ** 2;

const CUT_TOPIC = 'Pattern cuts and slab';

export const columnEngineChecks: readonly EvidenceCheck[] = [
  ...COLUMN_REFERENCES.flatMap((reference) =>
    (['smooth', 'rough'] as const).flatMap((copper) => columnChecks(reference, copper)),
  ),
  ...patches.map(
    (patch): EvidenceCheck => ({
      id: `column.patch-resonance-${Math.round(patch.h * 1e6)}`,
      topic: 'Patch columns: network against full wave',
      quantity: `resonance of an edge-fed patch without loss, ${patch.name}`,
      source: MPIE,
      howKnown: 'independent solution',
      expected: patch.f0,
      unit: 'GHz',
      tolerance: 0.003 * patch.f0,
      toleranceReason: '0.22 % of the network and 0.2 % of the reference, root of sum of squares',
      compute: once(() => resonance(patch)),
    }),
  ),
  ...(
    [
      [100, 1.0059],
      [127, 1.0096],
      [254, 1.0422],
    ] as const
  ).map(
    ([height, index]): EvidenceCheck => ({
      id: `slab.tm0-index-${height}`,
      topic: CUT_TOPIC,
      quantity: `index of the TM0 surface wave at 77 GHz, ${height} µm of permittivity 3.0`,
      source: INDEPENDENT_FULL_WAVE,
      howKnown: 'independent solution',
      expected: index,
      unit: '1',
      tolerance: 6e-5,
      toleranceReason: 'the four decimals given',
      compute: () => {
        const k0 = (2 * Math.PI * 77e9) / SPEED_OF_LIGHT;
        return tm0Wavenumber(k0, 3, height * 1e-6) / k0;
      },
    }),
  ),
  ...(
    [
      [
        'uniform-beamwidth',
        'half-power beamwidth of ten uniform elements at λ/2',
        10.209,
        '°',
        0.0006,
        () => cutShape(uniformArray(10)).halfPowerBeamwidth * DEG,
      ],
      [
        'uniform-sidelobe',
        'sidelobe level of ten uniform elements at λ/2',
        -12.966,
        'dB',
        0.005,
        () => cutShape(uniformArray(10)).sidelobeDb,
      ],
      [
        'chebyshev-beamwidth',
        'half-power beamwidth of the 26 dB Dolph–Chebyshev array of ten at λ/2',
        12.346,
        '°',
        0.0006,
        () => cutShape(chebyshevArray).halfPowerBeamwidth * DEG,
      ],
      [
        'chebyshev-sidelobe',
        'sidelobe level of that array',
        -26,
        'dB',
        0.01,
        () => cutShape(chebyshevArray).sidelobeDb,
      ],
    ] as const
  ).map(
    ([id, quantity, expected, unit, tolerance, compute]): EvidenceCheck => ({
      id: `cut.${id}`,
      topic: CUT_TOPIC,
      quantity,
      source: id.startsWith('uniform')
        ? 'array factor, any antenna text (Balanis, Antenna Theory, 2016, ch. 6)'
        : 'Dolph 1946; Balanis, Antenna Theory, 2016, example 6.9 (26 dB, ten elements)',
      howKnown: 'memory',
      expected,
      unit,
      tolerance,
      toleranceReason:
        unit === '°' ? 'the three decimals given' : 'parabola through samples half a degree apart at the top of a lobe',
      compute,
    }),
  ),
];
