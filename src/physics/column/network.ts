/**
 * Edge network: all patch edges of a board as nodes of one circuit, line sections between them, radiation and coupling
 * through the slab as admittances between all edges.
 *
 * Microstrip sections with loss by face; step reactances; covered edges; open ends; within a patch the admittances of its
 * edges, between patches the reaction of their macro currents, which also make the far field. Limits: infinite slab and
 * ground, no cover layer, dielectric loss of the fringing fields in the lines only, no radiation from lines and steps.
 */
import { abs2, type Complex, complex, div, inverse, scale, sub, ZERO } from '../../numerics/complex.js';
import { complexMatrix, factorise, solveInPlace } from '../../numerics/complex-lu.js';
import { boardRadiation } from './board-radiation.js';
import type { ColumnConditions, ColumnEngine, ColumnProblem, ColumnSolution, ExcitedArray } from './engine.js';
import { layoutCircuit } from './layout-circuit.js';
import { lineLosses, section, sectionCurrent } from './line-section.js';
import { lineTable } from './line-table.js';
import { NETWORK_CONSTANTS, type NetworkConstants } from './network-constants.js';
import { networkFlags } from './network-range.js';
import { addCoupling, edgePower } from './patch-coupling.js';
import { patchField } from './patch-field.js';

interface Port {
  readonly node: number;
  readonly reactance: number;
  readonly reference: number;
}

/**
 * Prepares the network of a board for frequencies up to `maximumFrequency` (Hz); each solve is then one frequency.
 *
 * @throws RangeError on a layout that is not physical, or where the slab guides more than TM0
 */
export function edgeNetwork(
  problem: ColumnProblem,
  maximumFrequency: number,
  constants: NetworkConstants = NETWORK_CONSTANTS,
): ColumnEngine {
  const circuit = layoutCircuit(problem.columns);
  const radiation = boardRadiation(problem, circuit, maximumFrequency, constants);

  function solve(conditions: ColumnConditions): ColumnSolution {
    const { frequency, faces, slab = problem.slab, stripThickness = problem.stripThickness } = conditions;
    if (frequency > maximumFrequency * (1 + 1e-9))
      throw new RangeError(`edgeNetwork: ${frequency} Hz is above the ${maximumFrequency} Hz it was prepared for`);
    const lines = lineTable(slab, stripThickness, frequency, faces, constants);
    const { edges, coupling } = radiation.at(frequency, slab, stripThickness, lines);
    const matrix = complexMatrix(circuit.nodes);
    addCoupling(matrix, circuit.edges, coupling);
    const put = (i: number, j: number, y: Complex): void => {
      matrix.re[i * matrix.n + j] += y.re;
      matrix.im[i * matrix.n + j] += y.im;
    };
    for (const { node, width, covered } of circuit.edges) put(node, node, complex(0, lines.edge(width, covered)));
    const sections = circuit.sections.map(({ from, to, width, length, stepFrom, stepTo }) =>
      section(from, to, lines.line(width), length, lines.step(width, stepFrom), lines.step(width, stepTo)),
    );
    for (const s of sections) {
      put(s.from, s.from, s.y11);
      put(s.from, s.to, s.y12);
      put(s.to, s.from, s.y12);
      put(s.to, s.to, s.y22);
    }
    // A line without end: its characteristic impedance, lossy as it is.
    const loads = circuit.loads.map(({ node, width, step }) => {
      const { characteristic } = lines.line(width);
      return { node, admittance: inverse(complex(characteristic.re, characteristic.im + lines.step(width, step))) };
    });
    for (const load of loads) put(load.node, load.node, load.admittance);
    const ports: Port[] = circuit.ports.map(({ node, width, step }) => ({
      node,
      reactance: lines.step(width, step),
      reference: problem.referenceImpedance === 'line' ? lines.line(width).impedance : problem.referenceImpedance,
    }));
    for (const port of ports) put(port.node, port.node, inverse(complex(port.reference, port.reactance)));
    const lu = factorise(matrix);

    /** Node voltages for waves `incident` into the ports. */
    function voltages(incident: readonly Complex[]): { re: Float64Array; im: Float64Array } {
      const re = new Float64Array(circuit.nodes);
      const im = new Float64Array(circuit.nodes);
      ports.forEach((port, c) => {
        const source = div(scale(incident[c], 2 * Math.sqrt(port.reference)), complex(port.reference, port.reactance));
        re[port.node] += source.re;
        im[port.node] += source.im;
      });
      solveInPlace(lu, re, im);
      return { re, im };
    }

    const portCurrent = (port: Port, a: Complex, v: Complex): Complex =>
      div(sub(scale(a, 2 * Math.sqrt(port.reference)), v), complex(port.reference, port.reactance));

    function excite(incident: readonly Complex[]): ExcitedArray {
      if (incident.length !== ports.length)
        throw new RangeError(`excite: ${incident.length} waves for ${ports.length} columns`);
      const { re, im } = voltages(incident);
      const reflected = ports.map((port, c) => {
        const current = portCurrent(port, incident[c], complex(re[port.node], im[port.node]));
        return sub(incident[c], scale(current, Math.sqrt(port.reference)));
      });
      const power = (waves: readonly Complex[]): number => waves.reduce((p, wave) => p + abs2(wave), 0) / 2;
      const out = edgePower(circuit.edges, coupling, re, im);
      const loadPower = loads.reduce(
        (p, { node, admittance }) => p + admittance.re * (re[node] ** 2 + im[node] ** 2),
        0,
      );
      // The mode's current leads its voltage by a quarter period: I = (j/ωL')(π/L) V.
      const amplitude = coupling.resistance.map((r) => 1 / Math.sqrt(r));
      const currents = {
        frequency,
        slab,
        patches: radiation.patches,
        re: out.im.map((a, p) => -a * amplitude[p]),
        im: out.re.map((a, p) => a * amplitude[p]),
      };
      const at = (of: Float64Array): Float64Array => Float64Array.from(circuit.edges, ({ node }) => of[node]);
      const longitudinal = problem.columns.map(() => [] as Complex[]);
      circuit.sections.forEach(({ patch }, s) => {
        if (patch < 0) return;
        const { column, patch: number } = circuit.patches[patch];
        const part = sectionCurrent(sections[s], re, im);
        const sum = longitudinal[column][number] ?? ZERO;
        // Along +x, whichever way the column runs.
        const direction = problem.columns[column].direction ?? 1;
        longitudinal[column][number] = complex(sum.re + direction * part.re, sum.im + direction * part.im);
      });
      return {
        reflected,
        power: {
          incident: power(incident),
          accepted: power(incident) - power(reflected),
          radiated: out.radiated,
          surfaceWave: out.surfaceWave,
          ...lineLosses(sections, re, im),
          load: loadPower / 2,
        },
        field: patchField(currents),
        edges: { frequency, slab, currents, edges, re: at(re), im: at(im) },
        patchCurrents: longitudinal,
      };
    }

    const scattering = ports.map(() => [] as Complex[]);
    ports.forEach((_, driven) => {
      const unit = ports.map((_, c) => (c === driven ? complex(1) : ZERO));
      const { re, im } = voltages(unit);
      ports.forEach((port, c) => {
        const current = portCurrent(port, unit[c], complex(re[port.node], im[port.node]));
        scattering[c][driven] = sub(unit[c], scale(current, Math.sqrt(port.reference)));
      });
    });
    return {
      frequency,
      scattering,
      referenceImpedance: ports.map((p) => p.reference),
      flags: networkFlags({ ...problem, slab }, frequency, constants),
      excite,
    };
  }

  return { name: 'edge network', solve };
}
