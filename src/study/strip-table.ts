/**
 * Solved strips for sweeps: the section and full wave of a microstrip cost some milliseconds, and a study asks for thousands
 * that differ by per cents. Around a centre all figures of a strip are smooth powers of its proportions; so each is kept as a
 * quadratic of logarithms, fitted to 15 solutions (28 with a cover), and evaluated in microseconds.
 *
 * Proportions: width and thickness over height, cover over thickness, permittivities, frequency times height; scaling all lengths and the
 * wavelength alike changes nothing. Against the solver itself effective permittivity, impedance and the sum of the loss
 * weights are within 1.5e-4, each weight within 2e-4 (that of the top, the smallest, 1e-3). With a flat cover about as
 * thick as the strip, where the solver itself steps by 0.25 % in permittivity, within 2e-3.
 */
import {
  type CoverCoat,
  type StripSection,
  type StripSolution,
  stillStrip,
  stripAt,
  stripFlags,
} from '../physics/line/index.js';

/** Half width of a cell in each logarithm: w/h, t/h, permittivity, f·h; cover over strip thickness, cover permittivity. */
const HALF = [0.12, 0.2, 0.05, 0.12, 0.25, 0.1] as const;
/** Which of them is the cover's thickness. */
const COVER_THICKNESS = 4;
/** The places of the fit, in half widths: inside, so that the error is shared between centre and corner. */
const STEP = 0.75;
/** A study with its searches asks for some dozen cells a board. */
const CELLS_KEPT = 256;

interface Cell {
  readonly centre: readonly number[];
  /** Figures at the centre, first and second differences, mixed differences by `i * n + j`, i > j. */
  readonly at: Float64Array;
  readonly first: readonly Float64Array[];
  readonly second: readonly Float64Array[];
  readonly mixed: readonly (Float64Array | undefined)[];
}

const cells = new Map<string, Cell>();

/** Logarithms of the proportions of a strip at a frequency. */
function placeOf({ width, height, thickness, permittivity, cover }: StripSection, frequency: number): number[] {
  const place = [width / height, thickness / height, permittivity, frequency * height];
  if (cover) place.push(cover.thickness / thickness, cover.permittivity);
  return place.map(Math.log);
}

/** Which cell, counted from the anchor's. Cells of a cover meet where it is as thick as the strip: its effect bends there. */
const cellIndex = (x: number, anchor: number, i: number): number =>
  i === COVER_THICKNESS ? Math.floor(x / (2 * HALF[i])) : Math.round((x - anchor) / (2 * HALF[i]));
const cellCentre = (index: number, anchor: number, i: number): number =>
  i === COVER_THICKNESS ? (2 * index + 1) * HALF[i] : anchor + 2 * index * HALF[i];

/**
 * A strip as `stripAt` solves it, from the table.
 *
 * @param anchor the strip and frequency that cells are laid around, the same for all that one study asks for: what moves by
 *               little then stays in one cell
 * @throws RangeError as `stillStrip` and `stripAt` do
 */
export function tabledStrip(
  section: StripSection,
  frequency: number,
  anchor: { readonly section: StripSection; readonly frequency: number },
): StripSolution {
  const { height, cover } = section;
  const x = placeOf(section, frequency);
  if (!x.every(Number.isFinite)) return stripAt(stillStrip(section), frequency);
  const origin = placeOf(anchor.section, anchor.frequency);
  const index = x.map((value, i) => cellIndex(value, origin[i], i));
  const centre = index.map((n, i) => cellCentre(n, origin[i], i));
  const key = `${centre.join(' ')} ${cover?.shape ?? ''}`;
  let cell = cells.get(key);
  if (!cell) {
    cell = cellAt(centre, cover?.shape);
    if (cells.size >= CELLS_KEPT) cells.clear();
    cells.set(key, cell);
  }
  const y = figuresAt(cell, x);
  const weight = (i: number): number => y[i] / height;
  return {
    section,
    frequency,
    impedance: y[0],
    effectivePermittivity: y[1],
    filling: { slab: y[2], cover: cover ? y[7] : 0 },
    weights: { underside: weight(3), top: weight(4), edges: weight(5), ground: weight(6) },
    flags: stripFlags(section, frequency),
  };
}

function figuresAt(cell: Cell, x: readonly number[]): Float64Array {
  const n = x.length;
  const o = x.map((value, i) => (value - cell.centre[i]) / (STEP * HALF[i]));
  const y = Float64Array.from(cell.at);
  for (let i = 0; i < n; i++)
    for (let k = 0; k < y.length; k++) {
      y[k] += o[i] * cell.first[i][k] + o[i] * o[i] * cell.second[i][k];
      for (let j = 0; j < i; j++) y[k] += o[i] * o[j] * (cell.mixed[i * n + j] as Float64Array)[k];
    }
  return y.map(Math.exp);
}

function cellAt(centre: readonly number[], shape: CoverCoat['shape'] | undefined): Cell {
  const n = centre.length;
  const solved = (...moves: readonly (readonly [number, number])[]) => {
    const x = [...centre];
    for (const [i, steps] of moves) x[i] += steps * STEP * HALF[i];
    return figuresOf(x.map(Math.exp), shape);
  };
  const at = solved();
  const up = centre.map((_, i) => solved([i, 1]));
  const down = centre.map((_, i) => solved([i, -1]));
  const mixed: (Float64Array | undefined)[] = new Array(n * n);
  for (let i = 0; i < n; i++)
    for (let j = 0; j < i; j++)
      mixed[i * n + j] = solved([i, 1], [j, 1]).map((v, k) => v - up[i][k] - up[j][k] + at[k]);
  return {
    centre,
    at,
    first: up.map((u, i) => u.map((v, k) => (v - down[i][k]) / 2)),
    second: up.map((u, i) => u.map((v, k) => (v + down[i][k]) / 2 - at[k])),
    mixed,
  };
}

/** Scaling changes nothing, so any height serves. */
const HEIGHT = 127e-6;

function figuresOf(
  [w, t, permittivity, fh, coat, coatPermittivity]: readonly number[],
  shape: CoverCoat['shape'] | undefined,
): Float64Array {
  const section: StripSection = {
    width: w * HEIGHT,
    height: HEIGHT,
    thickness: t * HEIGHT,
    permittivity,
    ...(shape ? { cover: { thickness: coat * t * HEIGHT, permittivity: coatPermittivity, shape } } : {}),
  };
  const { impedance, effectivePermittivity, filling, weights } = stripAt(stillStrip(section), fh / HEIGHT);
  const { underside, top, edges, ground } = weights;
  const per = [underside, top, edges, ground].map((weight) => weight * HEIGHT);
  return Float64Array.from(
    [impedance, effectivePermittivity, filling.slab, ...per, ...(shape ? [filling.cover] : [])],
    Math.log,
  );
}
