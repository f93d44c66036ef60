/**
 * Figures of a pattern cut after IEEE Std 145: direction of the maximum, half-power beamwidth, sidelobe level.
 */
export interface CutShape {
  /** Angles, rad, ascending, and intensity there, W/sr. */
  readonly angle: Float64Array;
  readonly intensity: Float64Array;
  readonly peak: number;
  /** rad */
  readonly beamDirection: number;
  /** rad; NaN when a half-power point lies outside the cut. */
  readonly halfPowerBeamwidth: number;
  /** Highest maximum outside the main lobe (bounded by its first minima) over the peak, dB; NaN without one. */
  readonly sidelobeDb: number;
}

/**
 * @param intensity power per solid angle in the cut, angle in rad
 * @param steps     samples from −90° to +90°, inclusive; 0.5° by default: fine enough for lobes 3° wide or more
 */
export function cutShape(intensity: (angle: number) => number, steps = 361): CutShape {
  const angle = Float64Array.from({ length: steps }, (_, i) => -Math.PI / 2 + (Math.PI * i) / (steps - 1));
  const value = angle.map(intensity);
  let top = 0;
  for (let i = 1; i < steps; i++) if (value[i] > value[top]) top = i;
  const step = Math.PI / (steps - 1);
  const beamDirection = refine(intensity, angle[top] - step, angle[top] + step);
  const peak = intensity(beamDirection);
  const left = halfPower(intensity, angle, value, top, -1, peak, beamDirection);
  const right = halfPower(intensity, angle, value, top, 1, peak, beamDirection);
  let [low, high] = [top, top];
  while (low > 0 && value[low - 1] < value[low]) low--;
  while (high < steps - 1 && value[high + 1] < value[high]) high++;
  let side = 0;
  for (let i = 1; i < steps - 1; i++) {
    if ((i > low && i < high) || value[i] < value[i - 1] || value[i] < value[i + 1]) continue;
    side = Math.max(side, parabolaTop(value[i - 1], value[i], value[i + 1]));
  }
  return {
    angle,
    intensity: value,
    peak,
    beamDirection,
    halfPowerBeamwidth: right - left,
    sidelobeDb: side > 0 ? 10 * Math.log10(side / peak) : Number.NaN,
  };
}

/** Golden-section search for the maximum between two angles, to 1e-6 rad. */
function refine(f: (a: number) => number, low: number, high: number): number {
  const ratio = (Math.sqrt(5) - 1) / 2;
  let [a, b] = [low, high];
  let [c, d] = [b - ratio * (b - a), a + ratio * (b - a)];
  let [fc, fd] = [f(c), f(d)];
  while (b - a > 1e-6) {
    if (fc > fd) {
      [b, d, fd] = [d, c, fc];
      c = b - ratio * (b - a);
      fc = f(c);
    } else {
      [a, c, fc] = [c, d, fd];
      d = a + ratio * (b - a);
      fd = f(d);
    }
  }
  return (a + b) / 2;
}

function halfPower(
  f: (a: number) => number,
  angle: Float64Array,
  value: Float64Array,
  top: number,
  direction: 1 | -1,
  peak: number,
  from: number,
): number {
  let i = top;
  while (i >= 0 && i < value.length && value[i] > peak / 2) i += direction;
  if (i < 0 || i >= value.length) return Number.NaN;
  let inside = i === top ? from : angle[i - direction];
  let outside = angle[i];
  for (let k = 0; k < 40; k++) {
    const middle = (inside + outside) / 2;
    if (f(middle) > peak / 2) inside = middle;
    else outside = middle;
  }
  return (inside + outside) / 2;
}

/** Maximum of the parabola through three equally spaced samples whose middle one is the largest. */
function parabolaTop(a: number, b: number, c: number): number {
  const curvature = a - 2 * b + c;
  return curvature === 0 ? b : b - (a - c) ** 2 / (8 * curvature);
}
