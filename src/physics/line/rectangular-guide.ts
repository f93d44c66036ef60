import { type Complex, complex, sqrt } from '../../numerics/complex.js';
import { ETA0, SPEED_OF_LIGHT } from '../constants.js';
import type { ValidityFlag } from '../validity.js';

/** Names of the inner walls of a guide: `top` and `bottom` are the broad pair, `left` and `right` the narrow one. */
export type GuideWall = 'top' | 'bottom' | 'left' | 'right';

export interface RectangularGuideInput {
  /** Broad inner width a, m. */
  readonly width: number;
  /** Inner height b, m. */
  readonly height: number;
  /** Relative permittivity of the filling. */
  readonly permittivity: number;
  readonly lossTangent: number;
  /** Hz, above cut-off. */
  readonly frequency: number;
  /** Surface impedance of each wall, ohm. A rough wall is referred to the plane that width and height are measured to. */
  readonly walls: Readonly<Record<GuideWall, Complex>>;
}

export interface RectangularGuide {
  /** Hz */
  readonly cutoff: number;
  /** rad/m, without loss and without the inner reactance of the walls */
  readonly beta: number;
  /** Propagation constant α + jβ with losses and the reactance of the walls, 1/m. */
  readonly gamma: Complex;
  /** Np/m */
  readonly dielectricLoss: number;
  /** Np/m, by wall. To first order their sum and `dielectricLoss` are Re γ. */
  readonly conductorLoss: Readonly<Record<GuideWall, number>>;
  readonly flags: readonly ValidityFlag[];
}

/** Frequency over cut-off below which figures of first order are off by more than about 1 % for walls of 1 % loss. */
const CLOSE_TO_CUTOFF = 1.05;

function rangeFlags(ratio: number, frequency: number, height: number, index: number): ValidityFlag[] {
  const flag = (code: string, text: string): ValidityFlag => ({
    code: `guide.${code}`,
    severity: 'outside',
    model: 'waveguide, TE10',
    text,
  });
  const flags: ValidityFlag[] = [];
  if (ratio < CLOSE_TO_CUTOFF)
    flags.push(
      flag(
        'cutoff-range',
        `The frequency is ${ratio.toFixed(3)} times the cut-off; losses are those of a small perturbation, which holds from ${CLOSE_TO_CUTOFF} times upward.`,
      ),
    );
  const next = Math.min(2, (2 * height * index * frequency) / SPEED_OF_LIGHT < 1 ? Number.POSITIVE_INFINITY : 0);
  if (ratio >= next)
    flags.push(
      flag('higher-mode', 'A second mode propagates at this frequency (TE20 or TE01); only TE10 is evaluated here.'),
    );
  return flags;
}

/**
 * TE10 mode of a filled rectangular waveguide with small losses, each wall with its own surface impedance.
 *
 * αd = k² tan δ/(2β); αc = [Rs(broad) a³k² + Rs(side) 2bπ²]/(a³ b β k η) with equal walls, half a pair's term for each.
 * Reactance slows the wave with the same weights; both join as γ² = −β² + 2jβ(αd + Σ Z·weight), which stays finite
 * towards cut-off.
 * Source: D. M. Pozar, "Microwave Engineering", 4th ed., 2012, section 3.3, eq. (3.29) and (3.96) (from memory);
 * reactance by the same perturbation integral. First order in the wall impedance over that of the wave.
 *
 * @throws RangeError at or below cut-off
 */
export function rectangularGuide(input: RectangularGuideInput): RectangularGuide {
  const { width: a, height: b, permittivity, lossTangent, frequency, walls } = input;
  const index = Math.sqrt(permittivity);
  const cutoff = SPEED_OF_LIGHT / (2 * a * index);
  if (!(frequency > cutoff)) throw new RangeError(`TE10 needs more than its cut-off of ${cutoff} Hz, got ${frequency}`);
  const k = (2 * Math.PI * frequency * index) / SPEED_OF_LIGHT;
  const beta = Math.sqrt(k * k - (Math.PI / a) ** 2);
  const common = a ** 3 * b * beta * k * (ETA0 / index);
  const broad = (a ** 3 * k * k) / 2 / common;
  const side = (b * Math.PI ** 2) / common;
  const dielectricLoss = (k * k * lossTangent) / (2 * beta);
  const conductorLoss = {
    top: walls.top.re * broad,
    bottom: walls.bottom.re * broad,
    left: walls.left.re * side,
    right: walls.right.re * side,
  };
  const loss = dielectricLoss + conductorLoss.top + conductorLoss.bottom + conductorLoss.left + conductorLoss.right;
  const delay = (walls.top.im + walls.bottom.im) * broad + (walls.left.im + walls.right.im) * side;
  return {
    cutoff,
    beta,
    gamma: sqrt(complex(-beta * beta - 2 * beta * delay, 2 * beta * loss)),
    dielectricLoss,
    conductorLoss,
    flags: rangeFlags(frequency / cutoff, frequency, b, index),
  };
}
