/**
 * Power lost along a line section between two nodes, exactly, from the waves on it.
 */
import { abs2, type Complex, complex, conj, div, exp, mul, scale, sub } from '../../numerics/complex.js';
import type { MicrostripLine } from '../line/index.js';

export interface SectionLoss {
  /** ∫|I|² dx, A² m: ½ R' times it is the power lost in a face. */
  readonly current: number;
  /** ∫|V|² dx, V² m. */
  readonly voltage: number;
}

/**
 * Integrals of |I|² and |V|² over a section of length l.
 * V(x) = a e^{−γx} + b e^{+γx}, I(x) = (a e^{−γx} − b e^{+γx})/Zc; closed forms, valid to the lossless limit.
 *
 * @param voltage V at x = 0
 * @param current I into the section at x = 0
 */
export function sectionLoss(line: MicrostripLine, length: number, voltage: Complex, current: Complex): SectionLoss {
  const { gamma, characteristic: zc } = line;
  const zi = mul(zc, current);
  const a = scale(complex(voltage.re + zi.re, voltage.im + zi.im), 0.5);
  const b = scale(sub(voltage, zi), 0.5);
  const twoAlpha = 2 * gamma.re;
  const forward = abs2(a) * (twoAlpha === 0 ? length : -Math.expm1(-twoAlpha * length) / twoAlpha);
  const backward = abs2(b) * (twoAlpha === 0 ? length : Math.expm1(twoAlpha * length) / twoAlpha);
  const phase = complex(0, -2 * gamma.im);
  const cross = mul(mul(a, conj(b)), div(sub(exp(scale(phase, length)), complex(1)), phase));
  return {
    voltage: forward + backward + 2 * cross.re,
    current: (forward + backward - 2 * cross.re) / abs2(zc),
  };
}
