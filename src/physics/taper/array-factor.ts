/** |Σ a_i e^{jψi}| of amplitudes in phase over the phase ψ from element to element, rad. */
export function arrayFactor(amplitudes: readonly number[], psi: number): number {
  let [re, im] = [0, 0];
  const middle = (amplitudes.length - 1) / 2;
  for (let i = 0; i < amplitudes.length; i++) {
    re += amplitudes[i] * Math.cos(psi * (i - middle));
    im += amplitudes[i] * Math.sin(psi * (i - middle));
  }
  return Math.hypot(re, im);
}

const SAMPLES_PER_LOBE = 40;

/**
 * Highest sidelobe of the array factor over all ψ from the first minimum to π, relative to ψ = 0, in dB.
 * With elements half a wave apart that is every direction; further apart, every lobe short of the grating lobe.
 *
 * @returns negative dB, or NaN where the array factor has no sidelobe
 */
export function peakSidelobeDb(amplitudes: readonly number[]): number {
  const steps = SAMPLES_PER_LOBE * amplitudes.length;
  const at = (i: number): number => arrayFactor(amplitudes, (Math.PI * i) / steps);
  let i = 1;
  while (i <= steps && at(i) <= at(i - 1)) i++;
  let peak = 0;
  // ψ = π mirrors the array factor, so that the sample beyond it closes a lobe there.
  for (; i <= steps; i++) if (at(i) >= at(i - 1) && at(i) >= at(i + 1)) peak = Math.max(peak, lobeTop(at, i));
  return peak > 0 ? 20 * Math.log10(peak / at(0)) : Number.NaN;
}

/** Maximum between the samples beside `i`, by ternary search. */
function lobeTop(f: (i: number) => number, i: number): number {
  let [low, high] = [i - 1, i + 1];
  while (high - low > 1e-6) {
    const third = (high - low) / 3;
    if (f(low + third) < f(high - third)) low += third;
    else high -= third;
  }
  return f((low + high) / 2);
}
