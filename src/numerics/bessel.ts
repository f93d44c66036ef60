/**
 * Bessel functions of order zero of a real argument, from the cephes library (Moshier 1989; relative error below
 * 1e-15 near their maxima). The library compiles itself once at import.
 */
import cephes from 'cephes';

await cephes.compiled;

export const besselJ0 = (x: number): number => cephes.j0(x);
/** Second kind; x > 0. */
export const besselY0 = (x: number): number => cephes.y0(x);
/** Modified, second kind; x > 0. */
export const besselK0 = (x: number): number => cephes.k0(x);
