/** A scale from data to pixels that the layout of labels shares with the drawn chart. */
export interface Scale {
  readonly type: 'linear' | 'log';
  readonly domain: readonly [number, number];
  readonly toPixel: (value: number) => number;
  readonly toValue: (pixel: number) => number;
}

export function makeScale(
  type: 'linear' | 'log',
  domain: readonly [number, number],
  range: readonly [number, number],
): Scale {
  const [low, high] = domain;
  if (!(high > low) || (type === 'log' && low <= 0))
    throw new RangeError(`chart: no ${type} scale over ${low}…${high}`);
  const forward = type === 'log' ? Math.log : (value: number) => value;
  const back = type === 'log' ? Math.exp : (value: number) => value;
  const ratio = (range[1] - range[0]) / (forward(high) - forward(low));
  return {
    type,
    domain,
    toPixel: (value) => range[0] + (forward(value) - forward(low)) * ratio,
    toValue: (pixel) => back(forward(low) + (pixel - range[0]) / ratio),
  };
}

const decimalSteps = [1, 2, 5, 10];
const angleSteps = [1, 2, 5, 10, 15, 30, 45, 90];

/** Smallest step of 1, 2 or 5 times a power of ten that leaves at most `count` intervals. */
export function niceStep(span: number, count: number): number {
  const power = 10 ** Math.floor(Math.log10(span / count));
  return (decimalSteps.find((step) => step * power * count >= span * (1 - 1e-9)) ?? 10) * power;
}

/** Step for degrees: divisors of the right angle. */
export function angleStep(span: number, count: number): number {
  return angleSteps.find((step) => step * count >= span) ?? niceStep(span, count);
}

const tidy = (value: number) => Number(value.toPrecision(12));

/** Multiples of `step` inside the domain, ends included. */
export function linearTicks([low, high]: readonly [number, number], step: number): number[] {
  const ticks: number[] = [];
  for (let n = Math.ceil(low / step - 1e-6); n * step <= high + step * 1e-6; n += 1) ticks.push(tidy(n * step));
  return ticks;
}

/** 1, 2 and 5 times powers of ten inside the domain; powers only where that would crowd the axis. */
export function logTicks([low, high]: readonly [number, number]): number[] {
  const decades = Math.log10(high / low);
  const ticks: number[] = [];
  for (let power = Math.floor(Math.log10(low)); 10 ** power <= high; power += 1) {
    for (const digit of decades > 4 ? [1] : [1, 2, 5]) {
      const value = tidy(digit * 10 ** power);
      if (value >= low * (1 - 1e-9) && value <= high * (1 + 1e-9)) ticks.push(value);
    }
  }
  return ticks;
}

/** Decimals that the multiples of a step need. */
export function decimalsOf(step: number): number {
  let decimals = 0;
  while (decimals < 6 && Math.abs(step * 10 ** decimals - Math.round(step * 10 ** decimals)) > 1e-6) decimals += 1;
  return decimals;
}

/** Domain around the values: given ends are kept, others are widened to a whole step (linear) or a little (log). */
export function fitDomain(values: readonly number[], type: 'linear' | 'log', zero = false): readonly [number, number] {
  const finite = values.filter((value) => Number.isFinite(value) && (type === 'linear' || value > 0));
  if (finite.length === 0) return type === 'log' ? [1, 10] : [0, 1];
  let low = Math.min(...finite, ...(zero && type === 'linear' ? [0] : []));
  let high = Math.max(...finite, ...(zero && type === 'linear' ? [0] : []));
  if (type === 'log') return high > low * 1.001 ? [low, high] : [low / 2, high * 2];
  if (high - low < 1e-9 * Math.max(1, Math.abs(high))) [low, high] = [low - 0.5, high + 0.5];
  const step = niceStep(high - low, 6);
  return [tidy(Math.floor(low / step + 1e-9) * step), tidy(Math.ceil(high / step - 1e-9) * step)];
}

/** Number for people: fixed decimals, true minus sign. */
export function printNumber(value: number, decimals: number, plus = false): string {
  const text = Math.abs(value).toFixed(decimals);
  const isZero = Number(text) === 0;
  if (isZero) return text;
  return (value < 0 ? '\u2212' : plus ? '+' : '') + text;
}
