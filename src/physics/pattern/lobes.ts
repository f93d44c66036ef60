/** Lobes of a cut: every maximum with its place, nulls of the main beam, first and highest sidelobe, lobes above a mask. */

export interface Lobe {
  /** rad */
  readonly angle: number;
  /** Over the maximum of the cut, dB, ≤ 0. */
  readonly levelDb: number;
}

/** Below this a maximum is rounding. */
const NOISE_DB = -200;

export interface CutLobes {
  readonly main: Lobe;
  /** All other maxima, by angle; those at the very ends of the cut are none. */
  readonly sidelobes: readonly Lobe[];
  /** Nearest to the main lobe on either side; absent where there is none. */
  readonly firstBelow?: Lobe;
  readonly firstAbove?: Lobe;
  /** Highest sidelobe. */
  readonly highest?: Lobe;
  /** First minima that bound the main lobe, rad; the end of the cut where there is none. */
  readonly mainFrom: number;
  readonly mainTo: number;
}

/**
 * Maxima between samples by parabolas through three levels in decibels: 0.01 dB at 12 samples to the lobe.
 *
 * @param angle     rad, ascending, even steps
 * @param intensity any unit of power per solid angle, ≥ 0
 * @throws RangeError when the lengths differ, under three samples, or nothing is radiated
 */
export function cutLobes(angle: ArrayLike<number>, intensity: ArrayLike<number>): CutLobes {
  const n = angle.length;
  if (n !== intensity.length || n < 3) throw new RangeError(`cutLobes: ${n} angles, ${intensity.length} intensities`);
  let top = 0;
  for (let i = 1; i < n; i++) if (intensity[i] > intensity[top]) top = i;
  if (!(intensity[top] > 0)) throw new RangeError('cutLobes: nothing is radiated into this cut');
  const step = (angle[n - 1] - angle[0]) / (n - 1);
  const level = (i: number): number => 10 * Math.log10(intensity[i] / intensity[top]);
  const summit = (i: number): { angle: number; levelDb: number } => {
    if (i === 0 || i === n - 1 || intensity[i - 1] === 0 || intensity[i + 1] === 0)
      return { angle: angle[i], levelDb: level(i) };
    const [a, b, c] = [level(i - 1), level(i), level(i + 1)];
    const curvature = a - 2 * b + c;
    if (curvature === 0) return { angle: angle[i], levelDb: b };
    return { angle: angle[i] + (step * (a - c)) / (2 * curvature), levelDb: b - (a - c) ** 2 / (8 * curvature) };
  };
  let [low, high] = [top, top];
  while (low > 0 && intensity[low - 1] < intensity[low]) low--;
  while (high < n - 1 && intensity[high + 1] < intensity[high]) high++;
  const summitOfAll = summit(top);
  const sidelobes: Lobe[] = [];
  for (let i = 1; i < n - 1; i++) {
    if (i >= low && i <= high) continue;
    if (level(i) < NOISE_DB) continue;
    // ≥ on one side only, so that a plateau of two samples counts once.
    if (!(intensity[i] > intensity[i - 1] && intensity[i] >= intensity[i + 1])) continue;
    const found = summit(i);
    sidelobes.push({ angle: found.angle, levelDb: found.levelDb - summitOfAll.levelDb });
  }
  const below = sidelobes.filter((lobe) => lobe.angle < summitOfAll.angle);
  const above = sidelobes.filter((lobe) => lobe.angle > summitOfAll.angle);
  return {
    main: { angle: summitOfAll.angle, levelDb: 0 },
    sidelobes,
    firstBelow: below.at(-1),
    firstAbove: above[0],
    highest: sidelobes.reduce<Lobe | undefined>((a, b) => (a && a.levelDb >= b.levelDb ? a : b), undefined),
    mainFrom: angle[low],
    mainTo: angle[high],
  };
}

/** Highest level allowed, dB under the maximum of the cut, from one angle to another (rad). */
export interface MaskSegment {
  readonly from: number;
  readonly to: number;
  readonly levelDb: number;
}

export interface MaskBreach {
  readonly angle: number;
  readonly levelDb: number;
  /** Over the mask, dB, > 0. */
  readonly excessDb: number;
}

/**
 * Where a cut stands above a mask; each run of samples over it gives its worst place. Angles that no segment names are free;
 * where segments overlap the strictest holds.
 *
 * @throws RangeError on a segment that ends before it begins
 */
export function againstMask(
  cut: { readonly angle: ArrayLike<number>; readonly intensity: ArrayLike<number> },
  mask: readonly MaskSegment[],
): readonly MaskBreach[] {
  for (const { from, to } of mask)
    if (!(from <= to)) throw new RangeError(`againstMask: a segment from ${from} to ${to} rad`);
  let peak = 0;
  for (let i = 0; i < cut.angle.length; i++) peak = Math.max(peak, cut.intensity[i]);
  const found: MaskBreach[] = [];
  let worst: MaskBreach | undefined;
  for (let i = 0; i <= cut.angle.length; i++) {
    let excessDb = Number.NEGATIVE_INFINITY;
    let levelDb = Number.NaN;
    if (i < cut.angle.length) {
      levelDb = 10 * Math.log10(cut.intensity[i] / peak);
      for (const segment of mask)
        if (cut.angle[i] >= segment.from && cut.angle[i] <= segment.to)
          excessDb = Math.max(excessDb, levelDb - segment.levelDb);
    }
    if (excessDb > 0) {
      if (!worst || excessDb > worst.excessDb) worst = { angle: cut.angle[i], levelDb, excessDb };
    } else if (worst) {
      found.push(worst);
      worst = undefined;
    }
  }
  return found;
}
