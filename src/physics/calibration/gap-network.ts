/** The edge network's patch without lines, driven by a gap across its middle: the counterpart of the full wave's. */
import { add, type Complex, complex, div, mul, ONE, tanh } from '../../numerics/complex.js';
import { boardRadiation } from '../column/board-radiation.js';
import type { ColumnProblem, Slab } from '../column/engine.js';
import type { LayoutCircuit } from '../column/layout-circuit.js';
import { lineTable } from '../column/line-table.js';
import type { NetworkConstants } from '../column/network-constants.js';
import type { FaceImpedances } from '../line/index.js';

/**
 * Impedance seen by the gap, ohm. By symmetry both edges carry opposite voltages, so each half is a line that ends in the
 * odd admittance of the two edges.
 *
 * @param patch m
 */
export function gapNetwork(
  patch: { readonly length: number; readonly width: number; readonly slab: Slab },
  maximumFrequency: number,
  constants: NetworkConstants,
): (frequency: number, faces: FaceImpedances) => Complex {
  const { length, width, slab } = patch;
  const edge = { patch: 0, y: 0, width, covered: 0 };
  const circuit: LayoutCircuit = {
    nodes: 2,
    patches: [{ column: 0, patch: 0, x: length / 2, y: 0, length, width }],
    edges: [
      { ...edge, node: 0, x: 0, sign: -1 },
      { ...edge, node: 1, x: length, sign: 1 },
    ],
    sections: [],
    ports: [],
    loads: [],
  };
  const problem: ColumnProblem = { slab, stripThickness: 0, columns: [], referenceImpedance: 'line' };
  const radiation = boardRadiation(problem, circuit, maximumFrequency, constants);
  return (frequency, faces) => {
    const lines = lineTable(slab, 0, frequency, faces, constants);
    const { admittance } = radiation.at(frequency, slab, 0, lines).coupling;
    const odd = complex(
      admittance.re[0] - admittance.re[1],
      admittance.im[0] - admittance.im[1] + lines.edge(width, 0),
    );
    const { characteristic, gamma } = lines.line(width);
    const t = tanh(complex((gamma.re * length) / 2, (gamma.im * length) / 2));
    // Both halves in series.
    const load = mul(odd, characteristic);
    const half = mul(characteristic, div(add(ONE, mul(load, t)), add(load, t)));
    return complex(2 * half.re, 2 * half.im);
  };
}
