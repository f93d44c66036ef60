/**
 * Smallest sample of which every piece must pass, so that with the confidence C at least the share R of all pieces
 * passes: n = ln(1 − C)/ln R, rounded up.
 *
 * Source: the binomial distribution with no failure, R^n ≤ 1 − C (the success-run formula; W. Weibull's and
 * others' reliability handbooks, from memory). Pieces drawn at random from one population; zero failures.
 *
 * @param confidence   C, between 0 and 1, both excluded
 * @param reliability  R, between 0 and 1, both excluded
 * @throws RangeError outside these
 */
export function successRunSize(confidence: number, reliability: number): number {
  for (const [name, value] of [
    ['confidence', confidence],
    ['reliability', reliability],
  ] as const) {
    if (!(value > 0 && value < 1)) throw new RangeError(`${name} must lie between 0 and 1, got ${value}`);
  }
  const exact = Math.log1p(-confidence) / Math.log(reliability);
  // A quotient that is whole but for rounding is whole: C = 0.75, R = 0.5 needs 2.
  return Math.max(1, Math.ceil(exact - 1e-9));
}
