import type { Complex } from '../../numerics/complex.js';
import type { ValidityFlag } from '../validity.js';
import { rectangularGuide } from './rectangular-guide.js';

/** Which published rule gives the width of the solid-walled guide that stands for the two rows of vias. */
export type SiwWidthRule = 'xu-wu' | 'cassivi';

/** A substrate-integrated waveguide: two rows of plated vias between the two foils of a laminate. Lengths in m. */
export interface SiwGeometry {
  /** Distance of the rows, between centres of vias. */
  readonly rowDistance: number;
  readonly viaDiameter: number;
  /** Distance of neighbours in a row, between centres. */
  readonly viaPitch: number;
  /** Height of the dielectric between the foils. */
  readonly height: number;
  /** Relative permittivity of the dielectric, ≥ 1. */
  readonly permittivity: number;
}

export interface SiwInput {
  readonly geometry: SiwGeometry;
  readonly lossTangent: number;
  /** Hz, above cut-off */
  readonly frequency: number;
  /** Surface impedance of the two foils, each towards the dielectric, and of the via walls, ohm. */
  readonly walls: { readonly top: Complex; readonly bottom: Complex; readonly vias: Complex };
  /** Default `xu-wu`. */
  readonly widthRule?: SiwWidthRule;
}

export interface SiwLine {
  /** Width of the solid-walled guide by the rule asked for, and by both rules, m. */
  readonly equivalentWidth: number;
  readonly equivalentWidths: Readonly<Record<SiwWidthRule, number>>;
  /** Hz */
  readonly cutoff: number;
  /** rad/m, without loss and reactance of the walls */
  readonly beta: number;
  /** Propagation constant α + jβ, 1/m. */
  readonly gamma: Complex;
  /** Np/m */
  readonly dielectricLoss: number;
  /** Np/m, by face; `vias` is both rows together. */
  readonly conductorLoss: { readonly top: number; readonly bottom: number; readonly vias: number };
  readonly flags: readonly ValidityFlag[];
}

/**
 * Width of the equivalent solid-walled guide, m.
 *
 * `xu-wu`: a − 1.08 d²/s + 0.1 d²/a. F. Xu and K. Wu, IEEE Trans. Microwave Theory Tech. 53(1), 2005, pp. 66–73.
 * `cassivi`: a − d²/(0.95 s). Y. Cassivi et al., IEEE Microwave Wireless Compon. Lett. 12(9), 2002, pp. 333–335.
 * (Both from memory.) For s < 3d and d < a/5 they agree within about 0.1 %.
 *
 * @throws RangeError on lengths that are not positive, or vias that touch or fill the guide
 */
export function siwEquivalentWidth(g: SiwGeometry, rule: SiwWidthRule): number {
  const { rowDistance: a, viaDiameter: d, viaPitch: s } = g;
  for (const [name, value] of Object.entries({ 'row distance': a, 'via diameter': d, 'via pitch': s }))
    if (!(Number.isFinite(value) && value > 0)) throw new RangeError(`${name} must be a positive length, got ${value}`);
  if (!(s > d)) throw new RangeError(`vias of diameter ${d} m at a pitch of ${s} m run into each other`);
  if (!(d < a)) throw new RangeError(`vias of diameter ${d} m fill rows ${a} m apart`);
  return rule === 'xu-wu' ? a - (1.08 * d * d) / s + (0.1 * d * d) / a : a - (d * d) / (0.95 * s);
}

/** Pitch over diameter above which the rows are known to leak; below it leakage is small against the other losses. */
const LEAK_FREE_PITCH = 2;

function rangeFlags(g: SiwGeometry): ValidityFlag[] {
  const { rowDistance: a, viaDiameter: d, viaPitch: s } = g;
  const flags: ValidityFlag[] = [];
  const flag = (code: string, severity: ValidityFlag['severity'], text: string): void => {
    flags.push({ code: `siw.${code}`, severity, model: 'substrate-integrated waveguide, equivalent width', text });
  };
  if (s >= 3 * d)
    flag(
      'pitch-range',
      'outside',
      `Via pitch is ${(s / d).toFixed(2)} diameters; the rules for the equivalent width hold below 3.`,
    );
  if (d >= a / 5)
    flag(
      'diameter-range',
      'outside',
      `Via diameter is ${(d / a).toFixed(2)} of the row distance; the rules for the equivalent width hold below 0.2.`,
    );
  if (s > LEAK_FREE_PITCH * d)
    flag(
      'leakage',
      'note',
      `Via pitch is ${(s / d).toFixed(2)} diameters; above ${LEAK_FREE_PITCH} the rows leak, and leakage is not part of the loss given here.`,
    );
  return flags;
}

/**
 * TE10 mode of a substrate-integrated waveguide as that of a solid-walled guide of equivalent width: dielectric loss, and
 * loss of each foil and of the vias with its own surface impedance.
 *
 * On thin laminates the foils carry some nine tenths of the metal loss, and they face the dielectric with their treated
 * side. The via walls count as flat side walls of the equivalent guide; no leakage, no launch.
 *
 * @throws RangeError at or below cut-off, or on a geometry that is not physical
 */
export function siwLine(input: SiwInput): SiwLine {
  const { geometry, lossTangent, frequency, walls, widthRule = 'xu-wu' } = input;
  if (!(geometry.height > 0)) throw new RangeError(`height must be a positive length, got ${geometry.height}`);
  const equivalentWidths = {
    'xu-wu': siwEquivalentWidth(geometry, 'xu-wu'),
    cassivi: siwEquivalentWidth(geometry, 'cassivi'),
  };
  const guide = rectangularGuide({
    width: equivalentWidths[widthRule],
    height: geometry.height,
    permittivity: geometry.permittivity,
    lossTangent,
    frequency,
    walls: { top: walls.top, bottom: walls.bottom, left: walls.vias, right: walls.vias },
  });
  const { top, bottom, left, right } = guide.conductorLoss;
  return {
    equivalentWidth: equivalentWidths[widthRule],
    equivalentWidths,
    cutoff: guide.cutoff,
    beta: guide.beta,
    gamma: guide.gamma,
    dielectricLoss: guide.dielectricLoss,
    conductorLoss: { top, bottom, vias: left + right },
    flags: [...rangeFlags(geometry), ...guide.flags],
  };
}
