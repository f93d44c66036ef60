import type { Board } from '../manifest/model.js';
import { abs, type Complex, sub } from '../numerics/complex.js';
import type { EngineComparison, EngineFigures } from '../study/results.js';

/** A figure that both engines give, in the unit of print. */
export interface ComparedFigure {
  readonly id: string;
  readonly title: string;
  readonly unit: 'dB' | 'dBi' | 'deg' | '%';
  /** NaN where the figure does not exist there. */
  readonly of: (figures: EngineFigures, board: Board) => number;
}

const DEGREES = 180 / Math.PI;
/** As for the verdict: below this a reflection is as good as none. */
const SMALLEST = 1e-6;
const level = (magnitude: number): number => 20 * Math.log10(Math.max(magnitude, SMALLEST));
const largest = (magnitudes: readonly number[]): number =>
  magnitudes.length === 0 ? Number.NaN : Math.max(...magnitudes);

export const ownReflections = ({ scattering }: EngineFigures): readonly Complex[] => scattering.map((row, i) => row[i]);

/** Columns in order of y: neighbours stand side by side, whatever their number. */
function neighbours({ columns }: Board): readonly (readonly [number, number])[] {
  const order = columns.map((_, i) => i).sort((a, b) => columns[a].y - columns[b].y);
  return order.slice(1).map((column, i) => [order[i], column]);
}

const cutFigures = (plane: 'elevation' | 'azimuth', name: string): readonly ComparedFigure[] => [
  {
    id: `${plane}-direction`,
    title: `${name}: beam direction`,
    unit: 'deg',
    of: (figures) => figures[plane].beamDirection * DEGREES,
  },
  {
    id: `${plane}-beamwidth`,
    title: `${name}: half-power beamwidth`,
    unit: 'deg',
    of: (figures) => figures[plane].halfPowerBeamwidth * DEGREES,
  },
  { id: `${plane}-sidelobe`, title: `${name}: sidelobe`, unit: 'dB', of: (figures) => figures[plane].sidelobeDb },
];

export const COMPARED_FIGURES: readonly ComparedFigure[] = [
  {
    id: 'reflection',
    title: 'Reflection, passive, worst column',
    unit: 'dB',
    of: (figures) => level(largest(ownReflections(figures).map(abs))),
  },
  {
    id: 'active-reflection',
    title: 'Reflection, active, worst driven column',
    unit: 'dB',
    of: ({ activeReflection }, { feed }) =>
      level(largest(activeReflection.filter((_, i) => (feed[i]?.amplitude ?? 1) > 0).map(abs))),
  },
  {
    id: 'coupling',
    title: 'Coupling of neighbouring columns, strongest',
    unit: 'dB',
    of: ({ scattering }, board) => level(largest(neighbours(board).map(([a, b]) => abs(scattering[b][a])))),
  },
  {
    id: 'directivity',
    title: 'Directivity',
    unit: 'dBi',
    of: ({ directivity }) => 10 * Math.log10(directivity),
  },
  {
    id: 'gain',
    title: 'Gain at the column ports',
    unit: 'dBi',
    of: ({ directivity, radiationEfficiency }) => 10 * Math.log10(directivity * radiationEfficiency),
  },
  {
    id: 'efficiency',
    title: 'Radiation efficiency',
    unit: '%',
    of: ({ radiationEfficiency }) => 100 * radiationEfficiency,
  },
  {
    id: 'surface-wave',
    title: 'Share of the surface wave',
    unit: '%',
    of: ({ power }) => 100 * power.surfaceWave,
  },
  ...cutFigures('elevation', 'Elevation'),
  ...cutFigures('azimuth', 'Azimuth'),
];

/** Root mean square over the columns of the difference of complex passive reflections. */
export function reflectionDifference({ fullWave, network }: EngineComparison): number {
  const other = ownReflections(network);
  const squares = ownReflections(fullWave).map((own, i) => abs(sub(own, other[i])) ** 2);
  return Math.sqrt(squares.reduce((sum, square) => sum + square, 0) / Math.max(1, squares.length));
}

export interface FigureDifference {
  readonly figure: ComparedFigure;
  /** Full wave less network at each compared frequency that has both. */
  readonly points: readonly { readonly frequency: number; readonly difference: number }[];
}

export function differencesOf(board: Board, points: readonly EngineComparison[]): readonly FigureDifference[] {
  return COMPARED_FIGURES.map((figure) => ({
    figure,
    points: points
      .map(({ frequency, fullWave, network }) => ({
        frequency,
        difference: figure.of(fullWave, board) - figure.of(network, board),
      }))
      .filter(({ difference }) => Number.isFinite(difference)),
  }));
}
