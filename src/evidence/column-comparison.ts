/** Either engine against the independent solutions of columns, row by row; each comparison is worked out once. */
import { complex } from '../numerics/complex.js';
import { minimumBetween } from '../numerics/golden-section.js';
import { splineSlopes } from '../numerics/spline.js';
import { arrayFigures } from '../physics/array/index.js';
import type { ColumnEngine } from '../physics/column/index.js';
import { once } from './check.js';
import { COLUMN_REFERENCES, type ColumnReference } from './column-references.js';
import { columnsProblem, type EngineName, prepare, rms, sheetFaces } from './engine-problems.js';
import { TWO_COLUMNS } from './patch-references.js';

const DEG = 180 / Math.PI;
const BAND = { low: 76e9, high: 80e9 };

/** Engine less reference at one frequency. */
export interface ColumnDifference {
  readonly fGHz: number;
  readonly s11: readonly [number, number];
  readonly reflection: number;
  /** Of the reference. */
  readonly reflectionDb: number;
  readonly directivityDb: number;
  readonly gainDb: number;
  readonly tiltDeg: number;
  readonly sidelobeDb: number;
  /** Of the engine, for rough less smooth. */
  readonly engineGainDbi: number;
  readonly referenceGainDbi: number;
}

export interface ColumnComparison {
  readonly reference: ColumnReference;
  readonly copper: 'smooth' | 'rough';
  readonly rows: readonly ColumnDifference[];
}

const engineOf = (engine: EngineName, reference: ColumnReference): (() => ColumnEngine) =>
  once(() => prepare(engine, columnsProblem(reference), BAND));

function compare(
  engine: () => ColumnEngine,
  reference: ColumnReference,
  copper: 'smooth' | 'rough',
  only?: readonly number[],
): ColumnComparison {
  const rows = reference.rows
    .filter((row) => row.copper === copper && (!only || only.includes(row.fGHz)))
    .map((row): ColumnDifference => {
      const frequency = row.fGHz * 1e9;
      const solution = engine().solve({ frequency, faces: sheetFaces(copper, frequency) });
      const figures = arrayFigures(solution, [complex(1)]);
      const s = figures.passiveReflection[0];
      const directivityDb = 10 * Math.log10(figures.directivity);
      const engineGainDbi = directivityDb + 10 * Math.log10(figures.radiationEfficiency);
      return {
        fGHz: row.fGHz,
        s11: [s.re, s.im],
        reflection: Math.hypot(s.re - row.s11[0], s.im - row.s11[1]),
        reflectionDb: 20 * Math.log10(Math.hypot(row.s11[0], row.s11[1])),
        directivityDb: directivityDb - row.directivityDbi,
        gainDb: engineGainDbi - row.gainDbi,
        tiltDeg: figures.elevation.beamDirection * DEG - row.tiltDeg,
        sidelobeDb: figures.elevation.sidelobeDb - row.sidelobeDb,
        engineGainDbi,
        referenceGainDbi: row.gainDbi,
      };
    });
  return { reference, copper, rows };
}

/** GHz at which the full wave is held to the references: enough to see match, slope and dip, few enough to build in seconds. */
const FULL_WAVE_GHZ: readonly (readonly [heightUm: number, copper: 'smooth' | 'rough', fGHz: readonly number[]])[] = [
  [127, 'smooth', [76, 78, 80]],
  [127, 'rough', [78]],
  [100, 'smooth', [77, 79]],
];

/** The network at every row of the references, the full wave at some. */
const comparisons = (engine: EngineName): (() => readonly ColumnComparison[]) =>
  once(() =>
    COLUMN_REFERENCES.flatMap((reference) => {
      const prepared = engineOf(engine, reference);
      if (engine === 'network')
        return (['smooth', 'rough'] as const).map((copper) => compare(prepared, reference, copper));
      return FULL_WAVE_GHZ.filter(([height]) => height === heightUm(reference)).map(([, copper, fGHz]) =>
        compare(prepared, reference, copper, fGHz),
      );
    }),
  );

export const heightUm = (reference: { readonly height: number }): number => Math.round(reference.height * 1e6);

export const columnComparisons: Readonly<Record<EngineName, () => readonly ColumnComparison[]>> = {
  network: comparisons('network'),
  'full wave': comparisons('full wave'),
};

/**
 * Frequency by which the reference must be moved to lie best on the engine's reflections, GHz: rms difference of complex
 * reflections against the reference's spline, within ±0.7 GHz.
 */
export function bestShift({ reference, rows }: ColumnComparison): number {
  const s = reference.smoothReflection;
  const f = Float64Array.from({ length: s.length / 2 }, (_, i) => 74 + i / 2);
  const parts = [0, 1].map((part) => {
    const value = Float64Array.from(f, (_, i) => s[2 * i + part]);
    return { value, slope: splineSlopes(f, value) };
  });
  const at = ({ value, slope }: (typeof parts)[number], fGHz: number): number => {
    const i = Math.min(f.length - 2, Math.floor((fGHz - f[0]) * 2));
    const h = 0.5;
    const t = (fGHz - f[i]) / h;
    return (
      (1 + 2 * t) * (1 - t) ** 2 * value[i] +
      t * (1 - t) ** 2 * h * slope[i] +
      t * t * (3 - 2 * t) * value[i + 1] +
      t * t * (t - 1) * h * slope[i + 1]
    );
  };
  const distance = (shift: number): number =>
    rms(rows.map((row) => Math.hypot(...parts.map((part, k) => at(part, row.fGHz - shift) - row.s11[k]))));
  // The best of a coarse scan first: the distance may have more than one valley.
  let best = 0;
  for (let shift = -0.7; shift <= 0.7; shift += 0.05) if (distance(shift) < distance(best)) best = shift;
  return minimumBetween(distance, best - 0.05, best + 0.05, 1e-3).x;
}

/** Engine less reference of the coupling of two columns side by side, dB, at some of the frequencies. */
export function couplingDifferences(engine: EngineName, fGHz: readonly number[]): number[] {
  const prepared = prepare(engine, columnsProblem(TWO_COLUMNS, 2, TWO_COLUMNS.pitchMm * 1e-3), BAND);
  return TWO_COLUMNS.rows
    .filter(([f]) => fGHz.includes(f))
    .map(([f, , , re, im]) => {
      const s = prepared.solve({ frequency: f * 1e9, faces: sheetFaces('smooth', f * 1e9) }).scattering[1][0];
      return 20 * Math.log10(Math.hypot(s.re, s.im) / Math.hypot(re, im));
    });
}

/** Engine less reference of the gain that rough copper costs, dB: one per frequency where both coppers were solved. */
export function roughGainDifferences(engine: EngineName): number[] {
  const all = columnComparisons[engine]();
  return all.flatMap((rough) => {
    if (rough.copper !== 'rough') return [];
    const smooth = all.find((c) => c.reference === rough.reference && c.copper === 'smooth');
    return rough.rows.flatMap((row) => {
      const other = smooth?.rows.find((r) => r.fGHz === row.fGHz);
      if (!other || other.reflectionDb >= -5) return [];
      return [row.engineGainDbi - other.engineGainDbi - (row.referenceGainDbi - other.referenceGainDbi)];
    });
  });
}
