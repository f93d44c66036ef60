/** A line between two nodes with a reactance in series at either end: its admittances, and the power lost along it. */
import { add, type Complex, complex, div, inverse, mul, neg, scale, sub } from '../../numerics/complex.js';
import type { MicrostripLine } from '../line/index.js';
import type { PowerBudget } from './engine.js';
import { sectionLoss } from './section-power.js';

export interface Section {
  readonly from: number;
  readonly to: number;
  readonly line: MicrostripLine;
  readonly length: number;
  readonly reactanceFrom: number;
  readonly y11: Complex;
  readonly y12: Complex;
  readonly y22: Complex;
}

/** Admittances of reactance – line – reactance by their chain matrix: no singularity at a half wave. */
export function section(
  from: number,
  to: number,
  line: MicrostripLine,
  length: number,
  reactanceFrom: number,
  reactanceTo: number,
): Section {
  const angle = scale(line.gamma, length);
  // cosh, sinh from tanh would lose digits near a quarter wave: use the exponentials.
  const cosh = complex(Math.cosh(angle.re) * Math.cos(angle.im), Math.sinh(angle.re) * Math.sin(angle.im));
  const sinh = complex(Math.sinh(angle.re) * Math.cos(angle.im), Math.cosh(angle.re) * Math.sin(angle.im));
  const zc = line.characteristic;
  const x1 = complex(0, reactanceFrom);
  const x2 = complex(0, reactanceTo);
  const c = div(sinh, zc);
  const a = add(cosh, mul(x1, c));
  const d = add(cosh, mul(x2, c));
  const b = add(add(mul(zc, sinh), mul(x1, cosh)), mul(x2, a));
  return { from, to, line, length, reactanceFrom, y11: div(d, b), y12: neg(inverse(b)), y22: div(a, b) };
}

export type LineLosses = Pick<PowerBudget, 'underside' | 'top' | 'edges' | 'ground' | 'dielectric'>;

/** Power lost in all sections by face, W, from the node voltages. */
export function lineLosses(sections: readonly Section[], re: Float64Array, im: Float64Array): LineLosses {
  const loss = { underside: 0, top: 0, edges: 0, ground: 0, dielectric: 0 };
  for (const s of sections) {
    const v1 = complex(re[s.from], im[s.from]);
    const v2 = complex(re[s.to], im[s.to]);
    const current = add(mul(s.y11, v1), mul(s.y12, v2));
    const start = sub(v1, mul(complex(0, s.reactanceFrom), current));
    const integral = sectionLoss(s.line, s.length, start, current);
    const r = s.line.seriesResistanceByFace;
    loss.underside += (r.underside * integral.current) / 2;
    loss.top += (r.top * integral.current) / 2;
    loss.edges += (r.edges * integral.current) / 2;
    loss.ground += (r.ground * integral.current) / 2;
    loss.dielectric += (s.line.shuntConductance * integral.voltage) / 2;
  }
  return loss;
}

/** ∫ I dx over a section between its nodes, A m: (V1 − V2)/Z' per length, from the telegrapher's equation −dV/dx = Z' I. */
export function sectionCurrent({ from, to, line }: Section, re: Float64Array, im: Float64Array): Complex {
  return div(complex(re[from] - re[to], im[from] - im[to]), mul(line.gamma, line.characteristic));
}
