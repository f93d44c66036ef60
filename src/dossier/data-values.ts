import type { Complex } from '../numerics/complex.js';
import type { CutFigures } from '../study/results.js';

const DIGITS = 12;

/** 12 significant digits: more than any figure here deserves, fewer than differ between engines of the language. */
export const num = (x: number): number => Number(x.toPrecision(DIGITS));
/** `null` where there is no number. */
export const maybe = (x: number | undefined): number | null => (x === undefined || !Number.isFinite(x) ? null : num(x));

export const complexData = ({ re, im }: Complex) => ({ re: maybe(re), im: maybe(im) });
export const matrixData = (matrix: readonly (readonly Complex[])[]) => matrix.map((row) => row.map(complexData));
export const cutFiguresData = (f: CutFigures) => ({
  beamDirectionRad: maybe(f.beamDirection),
  halfPowerBeamwidthRad: maybe(f.halfPowerBeamwidth),
  sidelobeDb: maybe(f.sidelobeDb),
});
