/** Where a function of one variable crosses zero, kept between a point on either side. */
export interface Bracket {
  /** Argument at which the function has the sign it had at `from`, and its value. */
  readonly inside: number;
  /** Argument at which it has the other sign. */
  readonly outside: number;
  /** Calls of the function made, those at the ends not counted. */
  readonly calls: number;
}

/**
 * Narrows a sign change to a tolerance: inverse quadratic and secant steps, bisection where they do not gain.
 *
 * Source: R. P. Brent, "Algorithms for Minimization without Derivatives", Prentice-Hall 1973, chapter 4, algorithm zero.
 * Never slower than bisection by more than a small factor; needs a continuous function, not a smooth one. Both ends are
 * returned, because a permitted value is one that is known to be permitted, not one in the middle.
 *
 * @param f          function, finite between the ends
 * @param from       end whose sign counts as inside, with its value `fFrom`
 * @param to         other end, with its value `fTo` of the other sign (or zero, which counts as outside)
 * @param tolerance  largest distance between the ends returned, > 0
 * @throws RangeError when the ends do not differ in sign, or the tolerance is not positive
 */
export function bracketedRoot(
  f: (x: number) => number,
  [from, fFrom]: readonly [number, number],
  [to, fTo]: readonly [number, number],
  tolerance: number,
): Bracket {
  if (!(tolerance > 0)) throw new RangeError(`the tolerance must be positive, got ${tolerance}`);
  const inside = (value: number): boolean => (fFrom > 0 ? value > 0 : value < 0);
  if (!Number.isFinite(fFrom) || !Number.isFinite(fTo) || fFrom === 0 || inside(fTo)) {
    throw new RangeError(`no sign change between ${from} (${fFrom}) and ${to} (${fTo})`);
  }
  let calls = 0;
  // b is the best estimate, c the end of the bracket opposite to it, a the estimate before.
  let [a, fa, b, fb] = [from, fFrom, to, fTo];
  let [c, fc] = [a, fa];
  let step = b - a;
  let before = step;
  while (Math.abs(b - c) > tolerance) {
    if (Math.abs(fc) < Math.abs(fb)) [a, fa, b, fb, c, fc] = [b, fb, c, fc, b, fb];
    const half = (c - b) / 2;
    const least = Math.min(tolerance / 2, Math.abs(half));
    const wanted = Math.abs(before) >= least && Math.abs(fa) > Math.abs(fb) ? interpolated(a, fa, b, fb, c, fc) : 0;
    const gains = wanted / half > 0 && Math.abs(wanted) < Math.min(1.5 * Math.abs(half), Math.abs(before) / 2);
    [before, step] = gains ? [step, wanted] : [half, half];
    [a, fa] = [b, fb];
    b += Math.abs(step) > least ? step : Math.sign(half) * least;
    fb = f(b);
    calls += 1;
    if (!Number.isFinite(fb)) throw new RangeError(`the function is not finite at ${b}`);
    if (inside(fb) === inside(fc)) {
      [c, fc] = [a, fa];
      before = b - a;
      step = before;
    }
  }
  return inside(fb) ? { inside: b, outside: c, calls } : { inside: c, outside: b, calls };
}

/** Step from b: inverse quadratic through three points, secant where two of them are one; 0 where there is none. */
function interpolated(a: number, fa: number, b: number, fb: number, c: number, fc: number): number {
  const s = fb / fa;
  const secant = a === c;
  const [u, v] = [fa / fc, fb / fc];
  const p = secant ? (c - b) * s : s * ((c - b) * u * (u - v) - (b - a) * (v - 1));
  const q = secant ? 1 - s : (u - 1) * (v - 1) * (s - 1);
  return q === 0 ? 0 : -p / q;
}
