import type { Board } from '../manifest/model.js';
import { ZERO } from '../numerics/complex.js';
import { arrayFigures, incidentWaves } from '../physics/array/index.js';
import { edgeNetwork, guidedWavePower } from '../physics/column/index.js';
import { farFieldPower } from '../physics/pattern/index.js';
import { bandCentre } from './conditions.js';
import { columnGeometry } from './geometry.js';
import { nominalValues } from './nominal-values.js';

/** (far field + guided wave)/(power into the edges) of the board without any loss, at band centre. */
export function losslessClosure(board: Board): number {
  const values = nominalValues(board);
  const engine = edgeNetwork(
    {
      slab: { permittivity: values.permittivity, lossTangent: 0, height: values.height },
      stripThickness: values.stripThickness,
      columns: columnGeometry(board, 0),
      referenceImpedance: board.referenceImpedance,
    },
    bandCentre(board),
  );
  const solution = engine.solve({
    frequency: bandCentre(board),
    faces: { underside: ZERO, top: ZERO, edges: ZERO, ground: ZERO },
  });
  const { excited } = arrayFigures(solution, incidentWaves(board.feed));
  if (!excited.edges) throw new Error('losslessClosure: the edge network gives its edges');
  return (farFieldPower(excited.field) + guidedWavePower(excited.edges)) / excited.power.accepted;
}
