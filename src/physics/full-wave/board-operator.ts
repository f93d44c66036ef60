/** The equations of a board at one frequency: their product with a current, and the preconditioner. */
import { type Complex, complex } from '../../numerics/complex.js';
import type { LinearMap } from '../../numerics/gmres.js';
import { blockInverse } from './block-inverse.js';
import type { BoardSetup } from './board-setup.js';
import { addLocal, type LocalMatrix, localMatrix, localTerms } from './local-terms.js';
import { reactionSpectrum } from './reaction-spectrum.js';
import { coverPermittivity, type SlabMedium, slabPermittivity } from './slab-medium.js';
import type { SlabReactions } from './slab-reactions.js';

export interface BoardOperator {
  readonly apply: LinearMap;
  readonly reactions: SlabReactions;
  readonly local: LocalMatrix;
}

/** @param sheet impedance of each rectangle of the mesh, ohm */
export function boardOperator(
  setup: BoardSetup,
  medium: SlabMedium,
  frequency: number,
  sheet: readonly Complex[],
): BoardOperator {
  const { mesh } = setup;
  const reactions = setup.reactions.at(frequency, medium);
  const product = setup.product(reactionSpectrum(reactions, mesh.nx, mesh.ny));
  const [under, over] = [slabPermittivity(medium), coverPermittivity(medium)];
  const ambient = complex((under.re + over.re) / 2, (under.im + over.im) / 2);
  const local = localMatrix(mesh, localTerms(mesh, frequency, sheet, ambient));
  return {
    reactions,
    local,
    apply: (x, y) => {
      product(x, y);
      addLocal(local, x, y);
    },
  };
}

/** Frequencies for which inverses are kept lie this much apart, as a ratio: between them an inverse is near enough. */
const ANCHOR_RATIO = 1.05;

/**
 * Preconditioners of a board, each worked out once, without loss, at the anchor nearest to the frequency asked for: they
 * do not hang on the order of the calls.
 */
export function anchoredInverses(
  setup: BoardSetup,
  medium: SlabMedium,
  band: { readonly low: number; readonly high: number },
): (frequency: number) => LinearMap {
  const kept = new Map<number, LinearMap>();
  const middle = Math.sqrt(band.low * band.high);
  const nothing = setup.mesh.rectangles.map(() => complex(0));
  const furthest = Math.floor(Math.log(band.high / middle) / Math.log(ANCHOR_RATIO) + 1e-9);
  return (frequency) => {
    const steps = Math.round(Math.log(frequency / middle) / Math.log(ANCHOR_RATIO));
    const anchor = middle * ANCHOR_RATIO ** Math.max(-furthest, Math.min(furthest, steps));
    let found = kept.get(anchor);
    if (!found) {
      const { reactions, local } = boardOperator(setup, medium, anchor, nothing);
      found = blockInverse(setup.mesh, setup.blocks, reactions, local);
      kept.set(anchor, found);
    }
    return found;
  };
}
