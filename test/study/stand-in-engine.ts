import { type ColumnEngine, edgeNetwork } from '../../src/physics/column/index.js';
import type { SolverFor } from '../../src/study/index.js';

export interface StandIn {
  /** Hz that its figures lie above the network's. */
  readonly shift?: number;
  /** Of the permittivity, relative. */
  readonly permittivity?: number;
  /** On the resistance of every face. */
  readonly loss?: number;
  /** Told of every frequency that is solved. */
  readonly onSolve?: (frequency: number) => void;
}

/** The network in the place of the full wave, changed as asked for: what a correction has to find is then known. */
export function standIn({ shift = 0, permittivity = 1, loss = 1, onSolve }: StandIn = {}): SolverFor {
  return (problem, band): ColumnEngine => {
    const network = edgeNetwork(problem, 1.015 * band.high);
    return {
      name: 'stand-in',
      solve({ frequency, faces, slab = problem.slab, stripThickness }) {
        onSolve?.(frequency);
        const lossy = (z: { re: number; im: number }) => ({ re: loss * z.re, im: z.im });
        const solution = network.solve({
          frequency: frequency - shift,
          faces: {
            underside: lossy(faces.underside),
            top: lossy(faces.top),
            edges: lossy(faces.edges),
            ground: lossy(faces.ground),
          },
          slab: { ...slab, permittivity: slab.permittivity * permittivity },
          stripThickness,
        });
        return {
          ...solution,
          frequency,
          effort: {
            unknowns: 100,
            iterations: 5,
            residual: 1e-5,
            cellLength: 80e-6,
            cellWidth: 80e-6,
            misfitLength: 0,
            misfitWidth: 0,
          },
        };
      },
    };
  };
}
