/** Immutable complex numbers for code that is not a hot loop; e^{+jωt} throughout the project. */
export interface Complex {
  readonly re: number;
  readonly im: number;
}

export const complex = (re: number, im = 0): Complex => ({ re, im });
export const ZERO: Complex = complex(0);
export const ONE: Complex = complex(1);
export const J: Complex = complex(0, 1);

export const add = (a: Complex, b: Complex): Complex => complex(a.re + b.re, a.im + b.im);
export const sub = (a: Complex, b: Complex): Complex => complex(a.re - b.re, a.im - b.im);
export const mul = (a: Complex, b: Complex): Complex => complex(a.re * b.re - a.im * b.im, a.re * b.im + a.im * b.re);
export const scale = (a: Complex, k: number): Complex => complex(a.re * k, a.im * k);
export const conj = (a: Complex): Complex => complex(a.re, -a.im);
export const neg = (a: Complex): Complex => complex(-a.re, -a.im);
export const abs = (a: Complex): number => Math.hypot(a.re, a.im);
/** |a|², without the square root. */
export const abs2 = (a: Complex): number => a.re * a.re + a.im * a.im;
/** Argument in radians, in (−π, π]. */
export const arg = (a: Complex): number => Math.atan2(a.im, a.re);
export const polar = (modulus: number, angle: number): Complex =>
  complex(modulus * Math.cos(angle), modulus * Math.sin(angle));

export function div(a: Complex, b: Complex): Complex {
  // Smith 1962: no overflow of |b|² for large or small b.
  if (Math.abs(b.re) >= Math.abs(b.im)) {
    const q = b.im / b.re;
    const d = b.re + b.im * q;
    return complex((a.re + a.im * q) / d, (a.im - a.re * q) / d);
  }
  const q = b.re / b.im;
  const d = b.re * q + b.im;
  return complex((a.re * q + a.im) / d, (a.im * q - a.re) / d);
}

export const inverse = (a: Complex): Complex => div(ONE, a);

/** Principal square root: real part never negative. */
export function sqrt(a: Complex): Complex {
  const m = abs(a);
  if (m === 0) return ZERO;
  const re = Math.sqrt((m + Math.abs(a.re)) / 2);
  const im = Math.abs(a.im) / (2 * re);
  const sign = a.im < 0 ? -1 : 1;
  return a.re >= 0 ? complex(re, sign * im) : complex(im, sign * re);
}

export function exp(a: Complex): Complex {
  return polar(Math.exp(a.re), a.im);
}

/** tanh for any argument: no overflow where |Re a| is large. */
export function tanh(a: Complex): Complex {
  if (Math.abs(a.re) > 20) return complex(Math.sign(a.re), 0);
  const d = Math.cosh(2 * a.re) + Math.cos(2 * a.im);
  return complex(Math.sinh(2 * a.re) / d, Math.sin(2 * a.im) / d);
}

export const coth = (a: Complex): Complex => inverse(tanh(a));

/** Principal natural logarithm: imaginary part in (−π, π]. */
export const log = (a: Complex): Complex => complex(Math.log(abs(a)), arg(a));
