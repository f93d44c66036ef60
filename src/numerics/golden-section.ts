/**
 * Minimum of a function of one variable between two bounds by golden-section search.
 *
 * Each step keeps the shorter bracket around the lower of two inner points and needs one new value; the bracket shrinks
 * by 0.618 a step, whatever the function. Source: J. Kiefer, Proc. Amer. Math. Soc. 4, 1953, pp. 502-506.
 *
 * @param low        lower bound
 * @param high       upper bound, above `low`
 * @param tolerance  half the width of the last bracket, > 0
 * @returns          the inner point with the lowest value met; the minimum itself where the function falls and then
 *                   rises between the bounds
 * @throws RangeError on bounds or a tolerance that make no bracket
 */
export function minimumBetween(
  f: (x: number) => number,
  low: number,
  high: number,
  tolerance: number,
): { readonly x: number; readonly value: number } {
  if (!(low < high && tolerance > 0)) {
    throw new RangeError(`minimumBetween: no bracket from ${low} to ${high} within ${tolerance}`);
  }
  const golden = (Math.sqrt(5) - 1) / 2;
  let [a, b] = [low, high];
  let [left, right] = [b - golden * (b - a), a + golden * (b - a)];
  let [atLeft, atRight] = [f(left), f(right)];
  while (b - a > 2 * tolerance) {
    if (atLeft <= atRight) {
      [b, right, atRight] = [right, left, atLeft];
      left = b - golden * (b - a);
      atLeft = f(left);
    } else {
      [a, left, atLeft] = [left, right, atRight];
      right = a + golden * (b - a);
      atRight = f(right);
    }
  }
  return atLeft <= atRight ? { x: left, value: atLeft } : { x: right, value: atRight };
}
