import type { Elements } from './section-elements.js';
import type { Run } from './section-mesh.js';
import type { FaceWeights } from './wheeler.js';

/**
 * Face weights of a section from the charge of the strip in air, which is distributed as the current of the line:
 * ∫J² ds/I² over each face, 1/m.
 */
export function faceWeightsOf(strip: readonly Run[], e: Elements, density: Float64Array): FaceWeights {
  const square = { underside: 0, edges: 0, top: 0 };
  let total = 0;
  let i = 0;
  for (const { part, nodes } of strip)
    for (let k = 0; k + 1 < nodes.length; k++, i++) {
      const charge = 2 * density[i] * e.length[i];
      if (part.kind === 'strip') square[part.face] += charge * density[i] * e.peaking[i];
      total += charge;
    }
  const per = 1 / (total * total);
  return {
    underside: square.underside * per,
    top: square.top * per,
    edges: square.edges * per,
    ground: groundSquare(e, density) * per,
  };
}

/**
 * ∫J² of the ground. A line current at height z leaves (1/π) z/(y² + z²) there, and two such shapes overlap as one of the
 * summed heights: the double sum needs no integration. Elements by two Gauss points.
 */
export function groundSquare(e: Elements, density: Float64Array): number {
  const n = density.length;
  const [y, z, q] = [new Float64Array(2 * n), new Float64Array(2 * n), new Float64Array(2 * n)];
  for (let i = 0; i < n; i++)
    for (const side of [0, 1]) {
      const at = (e.length[i] / 2) * (1 + (2 * side - 1) / Math.sqrt(3));
      y[2 * i + side] = e.y[i] + at * e.uy[i];
      z[2 * i + side] = e.z[i] + at * e.uz[i];
      q[2 * i + side] = (density[i] * e.length[i]) / 2;
    }
  let sum = 0;
  for (let i = 0; i < 2 * n; i++)
    for (let j = 0; j < 2 * n; j++) {
      const a = z[i] + z[j];
      sum += q[i] * q[j] * a * (1 / ((y[i] - y[j]) ** 2 + a * a) + 1 / ((y[i] + y[j]) ** 2 + a * a));
    }
  return (2 * sum) / Math.PI;
}
