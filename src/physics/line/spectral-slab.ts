import { SPEED_OF_LIGHT } from '../constants.js';

/** A grounded slab with a flat coat of its own height over the plane of the strip; all lossless. */
export interface SpectralSlab {
  /** m */
  readonly height: number;
  readonly permittivity: number;
  /** Coat from the strip's plane upward; none where absent. */
  readonly coat?: { readonly thickness: number; readonly permittivity: number };
}

/**
 * What the TM and TE transmission lines of a layered slab say of a sheet current at the strip's plane and one wavenumber
 * k along the plane, k above that of every guided wave. Per unit of sheet current: the tangential field, the current left in
 * the ground, and the current on the underside less that on the top.
 * Sources: T. Itoh, "Spectral domain immittance approach", IEEE Trans. Microwave Theory Tech. 28(7), 1980; e^{+jωt}.
 */
export interface SheetResponse {
  /** Field = −(1/jωε0)·`tm` (TM), −jωµ0·`te` (TE): 1/m and m. */
  tm: number;
  te: number;
  groundTm: number;
  groundTe: number;
  underLessTopTm: number;
  underLessTopTe: number;
}

export const noResponse = (): SheetResponse => ({
  tm: 0,
  te: 0,
  groundTm: 0,
  groundTe: 0,
  underLessTopTm: 0,
  underLessTopTe: 0,
});

/** Fills `out` for k² (1/m²) at the free-space wavenumber k0. */
export function sheetResponse(slab: SpectralSlab, k0: number, k2: number, out: SheetResponse): void {
  const { height: h, permittivity: er, coat } = slab;
  const s = k2 - er * k0 * k0;
  const u = Math.sqrt(Math.abs(s));
  const x = u * h;
  // u coth(uh) and u/sinh(uh); below the slab's own wavenumber both become u/tan and u/sin.
  const [coth, csch] =
    x < 1e-6
      ? [1 / h, 1 / h]
      : s > 0
        ? [u / Math.tanh(x), x < 40 ? u / Math.sinh(x) : 0]
        : [u / Math.tan(x), u / Math.sin(x)];
  const u0 = Math.sqrt(Math.max(k2 - k0 * k0, 0));
  // Admittances upward over jωε0 (TM) and over 1/jωµ0 (TE).
  let upTm = 1 / u0;
  let upTe = u0;
  if (coat) {
    const sc = k2 - coat.permittivity * k0 * k0;
    const uc = Math.sqrt(Math.abs(sc));
    const y = uc * coat.thickness;
    // tanh(uc d)/uc and uc tanh(uc d)
    const over = y < 1e-6 ? coat.thickness : (sc > 0 ? Math.tanh(y) : Math.tan(y)) / uc;
    const times = sc * over;
    upTe = (u0 + times) / (1 + u0 * over);
    upTm = (coat.permittivity * (coat.permittivity * over + 1 / u0)) / (coat.permittivity + times / u0);
  }
  // TM quantities times s, which may vanish.
  const downTm = er * coth;
  const sum = downTm + s * upTm;
  out.tm = s / sum;
  out.te = 1 / (coth + upTe);
  out.groundTm = (er * csch) / sum;
  out.groundTe = csch * out.te;
  out.underLessTopTm = (downTm - s * upTm) / sum;
  out.underLessTopTe = (coth - upTe) * out.te;
}

export const freeWavenumber = (frequency: number): number => (2 * Math.PI * frequency) / SPEED_OF_LIGHT;
