/**
 * Power of the excited edges found again from their fields, as a check on the circuit: the space wave by integrating
 * the far field over the half space, the guided wave from the spectrum at the TM0 pole.
 */
import { gaussLegendre } from '../../numerics/gauss-legendre.js';
import type { ExcitedEdges } from '../column/engine.js';
import { slabSpectrum } from '../column/slab-spectrum.js';
import { SPEED_OF_LIGHT } from '../constants.js';
import { radiationIntensity } from './edge-pattern.js';

/** Largest extent of the edges, m: sets how finely the sphere must be sampled. */
function extent(excited: ExcitedEdges): number {
  const xs = excited.edges.map((e) => e.x);
  const ys = excited.edges.map((e) => e.y);
  const width = Math.max(...excited.edges.flatMap((e) => e.pulses.map((p) => p.width)));
  return Math.hypot(Math.max(...xs) - Math.min(...xs), Math.max(...ys) - Math.min(...ys) + width);
}

/** ∫ U dΩ over z > 0, W; Gauss–Legendre in θ, equal steps in φ (exact for the band-limited field). */
export function farFieldPower(excited: ExcitedEdges): number {
  const k0 = (2 * Math.PI * excited.frequency) / SPEED_OF_LIGHT;
  const bandwidth = Math.ceil(k0 * extent(excited));
  const intensity = radiationIntensity(excited);
  const rule = gaussLegendre(24 + Math.ceil(bandwidth / 2));
  const steps = 4 * Math.ceil((16 + 2 * bandwidth) / 4);
  let power = 0;
  for (let i = 0; i < rule.nodes.length; i++) {
    const theta = (Math.PI / 4) * (rule.nodes[i] + 1);
    let ring = 0;
    for (let p = 0; p < steps; p++) {
      const phi = (2 * Math.PI * (p + 0.5)) / steps;
      ring += intensity(Math.sin(theta) * Math.cos(phi), Math.sin(theta) * Math.sin(phi));
    }
    power += (Math.PI / 4) * rule.weights[i] * Math.sin(theta) * ring * ((2 * Math.PI) / steps);
  }
  return power;
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
