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

export const preconditioner = (setup: BoardSetup, { reactions, local }: BoardOperator): LinearMap =>
  blockInverse(setup.mesh, setup.blocks, reactions, local);
