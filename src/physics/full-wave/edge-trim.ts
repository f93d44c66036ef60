/**
 * Edges of metal that do not lie where the grid draws them.
 *
 * Even charges in the outermost cells make metal act as if it ended a little inside the drawn edge: a further term on the
 * diagonal of these cells, κ/(2πε) for charge per length and µκ/(2π) for current along the edge, moves the acting edge
 * inwards for κ > 0 and outwards for κ < 0. Near an edge only the static field counts, so that κ follows from sections:
 * capacitance and inductance of the drawn strip are made those of the true one, thickness and cover included. Own
 * derivation. It lets every length and width be true on a coarse grid.
 */
import { bracketedRoot } from '../../numerics/brent.js';
import { EPS0, SPEED_OF_LIGHT } from '../constants.js';
import { stillStrip } from '../line/index.js';
import { ambientSum, rowCharges, rowPotentials, type StaticLayers } from './drawn-strip.js';

/**
 * Cells from a drawn edge inwards to where metal acts to end without a trim. At rest 0.07 to 0.11 for cells of one to a
 * fifth of the slab's height; the grid's own dispersion, which raises resonances by (π/n)²/24, asks for less on coarse and
 * more on fine grids. With this one value resonances hold within 0.1 % from 12 to 44 cells a patch.
 */
export const NATURAL_EDGE = 0.08;

export interface EdgeTrim {
  readonly charge: number;
  readonly current: number;
}

/** Capacitances over 2πε0 of a true strip: on its slab, and of the same metal in air. */
interface TrueStrip {
  readonly slab: number;
  readonly air: number;
}

export interface EdgeTrims {
  /**
   * Terms for an edge of a piece of metal.
   *
   * @param cells   of size `step` that draw the piece from this edge to the opposite one
   * @param extent  true distance between the two, m
   * @param inwards cells from the drawn edge to the true one
   */
  of(cells: number, step: number, extent: number, inwards: number): EdgeTrim;
}

/** Lower, little would be left of the outermost charge's own potential, and the equations be near to singular. */
const LEAST = -0.65;
const MOST = 12;
/** Wider pieces have edges that do not feel each other: their capacitance grows evenly with the width. */
const MOST_CELLS = 24;

export function edgeTrims(layers: StaticLayers, thickness: number): EdgeTrims {
  const strips = new Map<string, TrueStrip>();
  const potentials = new Map<string, { slab: Float64Array; air: Float64Array }>();
  const known = new Map<string, EdgeTrim>();
  const air: StaticLayers = { permittivity: 1, height: layers.height };

  function trueStrip(width: number, thickness: number): TrueStrip {
    const key = `${width} ${thickness}`;
    let found = strips.get(key);
    if (!found) {
      const { permittivity, height, cover } = layers;
      const coat = cover && { ...cover, shape: 'planar' as const };
      const still = stillStrip({ width, height, permittivity, thickness, ...(coat && { cover: coat }) });
      const { impedance, effectivePermittivity } = still.thick ?? still.sheet;
      const slowness = Math.sqrt(effectivePermittivity);
      const unit = 2 * Math.PI * EPS0 * SPEED_OF_LIGHT;
      found = { slab: slowness / (impedance * unit), air: 1 / (impedance * slowness * unit) };
      strips.set(key, found);
    }
    return found;
  }

  /** Between two solved widths, because every inwards distance asks for another. */
  function trueStripNear(width: number, around: number, thickness: number): TrueStrip {
    const at = trueStrip(around, thickness);
    if (Math.abs(width - around) < 1e-9) return at;
    const beside = trueStrip(around * 1.05, thickness);
    const t = (width - around) / (0.05 * around);
    return { slab: at.slab + t * (beside.slab - at.slab), air: at.air + t * (beside.air - at.air) };
  }

  /** What the true strip has more than a sheet that the grid draws as it should, over 2πε0. */
  function change(cells: number, step: number, around: number, inwards: number): TrueStrip {
    const wanted = trueStripNear((cells - 2 * inwards) * step, around, thickness);
    const drawn = trueStripNear((cells - 2 * NATURAL_EDGE) * step, around, 0);
    return { slab: wanted.slab - drawn.slab, air: wanted.air - drawn.air };
  }

  function rows(cells: number, step: number) {
    const key = `${cells} ${step}`;
    let found = potentials.get(key);
    if (!found) {
      found = { slab: rowPotentials(layers, step, cells), air: rowPotentials(air, step, cells) };
      potentials.set(key, found);
    }
    return found;
  }

  const matched = (potential: Float64Array, ambient: number, change: number): number => {
    const capacitance = (kappa: number): number =>
      rowCharges(potential, ambient, kappa, kappa).reduce((sum, q) => sum + q, 0);
    const target = capacitance(0) + change;
    const excess = (kappa: number): number => capacitance(kappa) - target;
    const [low, high] = [excess(LEAST), excess(MOST)];
    if (!(low > 0)) return LEAST;
    if (!(high < 0)) return MOST;
    return bracketedRoot(excess, [LEAST, low], [MOST, high], 1e-6).inside;
  };

  return {
    of(cells, step, extent, inwards) {
      const used = Math.min(cells, MOST_CELLS);
      const whole = used === cells ? extent : extent - (cells - used) * step;
      const key = `${used} ${step} ${whole.toExponential(9)} ${inwards.toFixed(7)}`;
      let found = known.get(key);
      if (!found) {
        const { slab, air: still } = rows(used, step);
        const wanted = change(used, step, whole, inwards);
        found = { charge: matched(slab, ambientSum(layers), wanted.slab), current: matched(still, 2, wanted.air) };
        known.set(key, found);
      }
      return found;
    },
  };
}
