/**
 * A feed network as a nodal circuit: lengths of line and resistors between nodes, ports of any real impedance.
 * Exact for its elements; junctions are points.
 */
import { abs2, add, type Complex, complex, div, inverse, mul, neg, scale, sub } from '../../numerics/complex.js';
import { type ComplexMatrix, complexMatrix, factorise, solveInPlace } from '../../numerics/complex-lu.js';

export interface CircuitLine {
  readonly from: number;
  readonly to: number;
  /** α + jβ, 1/m, and characteristic impedance, ohm. */
  readonly gamma: Complex;
  readonly characteristic: Complex;
  readonly length: number;
  /** Under which name its loss is summed. */
  readonly part: string;
}

export interface CircuitResistor {
  readonly from: number;
  readonly to: number;
  readonly resistance: number;
  readonly part: string;
}

export interface CircuitPort {
  readonly node: number;
  /** Ohm, real, > 0. */
  readonly reference: number;
}

export interface FeedCircuit {
  readonly nodes: number;
  readonly lines: readonly CircuitLine[];
  readonly resistors: readonly CircuitResistor[];
  readonly ports: readonly CircuitPort[];
}

export interface CircuitState {
  /** Row = leaving, column = driven. */
  readonly scattering: readonly (readonly Complex[])[];
  /** Power lost in each part, W, for waves into the ports (√W peak: |a|²/2). */
  loss(incident: readonly Complex[]): ReadonlyMap<string, number>;
}

/** @throws RangeError on a circuit that is not connected to its ports, or impedances that are not positive */
export function solveCircuit(circuit: FeedCircuit): CircuitState {
  const { nodes, lines, resistors, ports } = circuit;
  const matrix = complexMatrix(nodes);
  const admittances = lines.map(lineAdmittance);
  lines.forEach(({ from, to }, i) => {
    const { self, across } = admittances[i];
    put(matrix, from, from, self);
    put(matrix, to, to, self);
    put(matrix, from, to, across);
    put(matrix, to, from, across);
  });
  for (const { from, to, resistance } of resistors) {
    if (!(resistance > 0)) throw new RangeError(`a resistor must be above 0 ohm, got ${resistance}`);
    const g = complex(1 / resistance);
    put(matrix, from, from, g);
    put(matrix, to, to, g);
    put(matrix, from, to, neg(g));
    put(matrix, to, from, neg(g));
  }
  for (const { node, reference } of ports) {
    if (!(reference > 0)) throw new RangeError(`a port's impedance must be above 0 ohm, got ${reference}`);
    put(matrix, node, node, complex(1 / reference));
  }
  const lu = factorise(matrix);

  function voltages(incident: readonly Complex[]): { re: Float64Array; im: Float64Array } {
    const [re, im] = [new Float64Array(nodes), new Float64Array(nodes)];
    ports.forEach(({ node, reference }, p) => {
      re[node] += (2 * incident[p].re) / Math.sqrt(reference);
      im[node] += (2 * incident[p].im) / Math.sqrt(reference);
    });
    solveInPlace(lu, re, im);
    return { re, im };
  }

  const scattering = ports.map(() => [] as Complex[]);
  ports.forEach((_, driven) => {
    const unit = ports.map((_, p) => complex(p === driven ? 1 : 0));
    const { re, im } = voltages(unit);
    ports.forEach(({ node, reference }, p) => {
      scattering[p][driven] = sub(scale(complex(re[node], im[node]), 1 / Math.sqrt(reference)), unit[p]);
    });
  });

  function loss(incident: readonly Complex[]): Map<string, number> {
    if (incident.length !== ports.length)
      throw new RangeError(`feed circuit: ${incident.length} waves for ${ports.length} ports`);
    const { re, im } = voltages(incident);
    const at = (node: number): Complex => complex(re[node], im[node]);
    const found = new Map<string, number>();
    const book = (part: string, power: number): void => void found.set(part, (found.get(part) ?? 0) + power);
    lines.forEach(({ from, to, part }, i) => {
      const { self, across } = admittances[i];
      const [v1, v2] = [at(from), at(to)];
      const entering = (a: Complex, b: Complex): number => {
        const current = add(mul(self, a), mul(across, b));
        return (a.re * current.re + a.im * current.im) / 2;
      };
      book(part, entering(v1, v2) + entering(v2, v1));
    });
    for (const { from, to, resistance, part } of resistors) book(part, abs2(sub(at(from), at(to))) / (2 * resistance));
    return found;
  }

  return { scattering, loss };
}

function put(matrix: ComplexMatrix, i: number, j: number, y: Complex): void {
  matrix.re[i * matrix.n + j] += y.re;
  matrix.im[i * matrix.n + j] += y.im;
}

/** Y11 = Y22 = coth(γl)/Zc, Y12 = −1/(Zc sinh γl). */
function lineAdmittance({ gamma, characteristic, length }: CircuitLine): { self: Complex; across: Complex } {
  if (!(length > 0)) throw new RangeError(`a line of the feed must be longer than 0 m, got ${length}`);
  const { re, im } = scale(gamma, length);
  const cosh = complex(Math.cosh(re) * Math.cos(im), Math.sinh(re) * Math.sin(im));
  const sinh = complex(Math.sinh(re) * Math.cos(im), Math.cosh(re) * Math.sin(im));
  const b = mul(characteristic, sinh);
  return { self: div(cosh, b), across: neg(inverse(b)) };
}
