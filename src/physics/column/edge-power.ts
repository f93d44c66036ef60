/** Power of the excited edges in the guided wave of the slab, from the spectrum at the TM0 pole: a check on the circuit. */
import type { ExcitedEdges } from './engine.js';
import { slabSpectrum } from './slab-spectrum.js';

/** Largest extent of the edges, m: sets how finely the sphere must be sampled. */
function extent(excited: ExcitedEdges): number {
  const xs = excited.edges.map((e) => e.x);
  const ys = excited.edges.map((e) => e.y);
  const width = Math.max(...excited.edges.flatMap((e) => e.pulses.map((p) => p.width)));
  return Math.hypot(Math.max(...xs) - Math.min(...xs), Math.max(...ys) - Math.min(...ys) + width);
}

/** Power in the TM0 wave of the slab, W: (ω R/16π) ∫ |M_φ(kp, φ)|² dφ with R the residue of F at the pole. */
export function guidedWavePower(excited: ExcitedEdges): number {
  const { omega, kp, residueF } = slabSpectrum(excited.frequency, excited.slab.permittivity, excited.slab.height);
  const steps = 4 * Math.ceil((16 + 2 * kp * extent(excited)) / 4);
  let sum = 0;
  for (let p = 0; p < steps; p++) {
    const phi = (2 * Math.PI * (p + 0.5)) / steps;
    let [re, im] = [0, 0];
    excited.edges.forEach((edge, m) => {
      const ky = kp * Math.sin(phi);
      let a = 0;
      for (const pulse of edge.pulses) {
        const x = (ky * pulse.width) / 2;
        a += pulse.density * pulse.width * (x === 0 ? 1 : Math.sin(x) / x);
      }
      a *= edge.sign * Math.cos(phi);
      const phase = kp * Math.cos(phi) * edge.x + ky * edge.y;
      re += a * (excited.re[m] * Math.cos(phase) - excited.im[m] * Math.sin(phase));
      im += a * (excited.re[m] * Math.sin(phase) + excited.im[m] * Math.cos(phase));
    });
    sum += re * re + im * im;
  }
  return ((omega * residueF) / (16 * Math.PI)) * sum * ((2 * Math.PI) / steps);
}
