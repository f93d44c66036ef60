import type { Board, QuantityName, Requirement } from '../manifest/model.js';
import { abs } from '../numerics/complex.js';
import type { Cut, CutFigures, LinePoint, PointResult } from '../study/results.js';
import { columnPairs } from './column-pairs.js';
import { highestExcess } from './mask.js';

/** Unit in which limits, values and margins of a quantity are given. `1` is a plain ratio; empty for declared text. */
export type QuantityUnit = 'dBi' | 'dB' | 'deg' | 'dB/cm' | '1' | '';

export interface PointContext {
  /** Only what changes the value: the cut, the mask, and whether a limit applies to a signed angle or its magnitude. */
  readonly requirement: Pick<Requirement, 'cut' | 'mask' | 'limit' | 'between'>;
  readonly board: Board;
  /** Moves the pattern of the cut by this angle (rad) before it is compared with a mask; 0 where absent. */
  readonly patternShift?: number;
}

/** What one point yields: a finite number in the unit of the quantity, or why there is none. */
export type PointValue = { readonly value: number } | { readonly missing: string };

export interface Quantity {
  readonly name: QuantityName;
  readonly title: string;
  readonly unit: QuantityUnit;
  readonly cut: 'needed' | 'none';
  /** One sentence for the reader of a requirement. */
  readonly definition: string;
  /** From the columns at one point of a sweep … */
  readonly at: (point: PointResult, context: PointContext) => PointValue;
  /** … or from the feed line, which is evaluated where columns are not; then `at` has none. */
  readonly onLine?: (point: LinePoint) => PointValue;
}

const DEGREES = 180 / Math.PI;

/** A reflection below 1e-6 is no longer a number to argue about: it is given as −120 dB, which keeps levels finite. */
const SMALLEST_REFLECTION = 1e-6;

const finite = (value: number, missing: string): PointValue => (Number.isFinite(value) ? { value } : { missing });

const level = (ratio: number, name: string): PointValue =>
  finite(10 * Math.log10(ratio), `${name} is not a positive number there`);

function largestReflection(magnitudes: readonly number[], name: string): PointValue {
  if (magnitudes.length === 0) return { missing: `no column is driven, so there is no ${name}` };
  // Math.max returns NaN as soon as one column has no value, which is what must happen here.
  const largest = Math.max(...magnitudes);
  return finite(20 * Math.log10(Math.max(largest, SMALLEST_REFLECTION)), `${name} of a column was not evaluated there`);
}

function inCut(
  point: PointResult,
  context: PointContext,
  read: (figures: CutFigures, cut: Cut) => PointValue,
): PointValue {
  const plane = context.requirement.cut;
  if (plane === undefined) return { missing: 'the requirement names no cut' };
  return read(point[plane], point.cuts[plane]);
}

const CATALOGUE: Readonly<Record<QuantityName, Omit<Quantity, 'name'>>> = {
  directivity: {
    title: 'Directivity',
    unit: 'dBi',
    cut: 'none',
    definition: 'Directivity in the direction of the beam maximum, 10 log10 of the ratio to an isotropic radiator.',
    at: (point) => level(point.directivity, 'directivity'),
  },
  gain: {
    title: 'Gain',
    unit: 'dBi',
    cut: 'none',
    definition:
      'Gain in the direction of the beam maximum at the input of the feed network: directivity less all losses on the board and in the feed paths, without mismatch.',
    at: (point) => level(point.gain, 'gain'),
  },
  realized_gain: {
    title: 'Realized gain',
    unit: 'dBi',
    cut: 'none',
    definition:
      'Gain less the power reflected by the columns when all are driven with the weights of the feed, at the input of the feed network.',
    at: (point) => level(point.realizedGain, 'realized gain'),
  },
  radiation_efficiency: {
    title: 'Radiation efficiency',
    unit: '1',
    cut: 'none',
    definition:
      'Radiated power over the power accepted at the column ports; the power of the surface wave counts as lost.',
    at: (point) => finite(point.radiationEfficiency, 'radiation efficiency was not evaluated there'),
  },
  reflection: {
    title: 'Reflection, passive',
    unit: 'dB',
    cut: 'none',
    definition:
      'Largest magnitude of the reflection coefficient over the columns, each driven alone with the others terminated in the reference impedance, at the true edge of the first patch.',
    at: (point, { board }) => {
      const own = point.columnReflection.filter((_, i) => !board.columns[i]?.dummy);
      return largestReflection(own.map(abs), 'reflection');
    },
  },
  active_reflection: {
    title: 'Reflection, active',
    unit: 'dB',
    cut: 'none',
    definition:
      'Largest magnitude of the active reflection coefficient over the driven columns, all driven together with the weights of the feed, at the true edge of the first patch.',
    at: (point, { board }) => {
      const driven = point.activeReflection.filter((_, i) => (board.feed[i]?.amplitude ?? 1) > 0);
      return largestReflection(driven.map(abs), 'active reflection');
    },
  },
  half_power_beamwidth: {
    title: 'Half-power beamwidth',
    unit: 'deg',
    cut: 'needed',
    definition: 'Angle between the two directions of the main lobe where the gain is half that of the cut’s maximum.',
    at: (point, context) =>
      inCut(point, context, (figures) =>
        finite(figures.halfPowerBeamwidth * DEGREES, 'a half-power direction lies outside the cut'),
      ),
  },
  sidelobe_level: {
    title: 'Sidelobe level',
    unit: 'dB',
    cut: 'needed',
    definition: 'Highest lobe other than the main one, relative to the maximum of the same cut.',
    at: (point, context) =>
      inCut(point, context, (figures) =>
        finite(figures.sidelobeDb, 'the cut has no lobe apart from the main one, so a sidelobe level does not exist'),
      ),
  },
  beam_direction: {
    title: 'Beam direction',
    unit: 'deg',
    cut: 'needed',
    definition:
      'Direction of the cut’s maximum from broadside, positive towards +x (elevation, away from the feed) or +y (azimuth); an upper limit applies to its magnitude, a lower limit to the signed angle.',
    at: (point, context) =>
      inCut(point, context, (figures) => {
        const angle = figures.beamDirection * DEGREES;
        const value = context.requirement.limit?.direction === 'at_least' ? angle : Math.abs(angle);
        return finite(value, 'the cut has no single maximum there');
      }),
  },
  pattern_mask: {
    title: 'Pattern mask',
    unit: 'dB',
    cut: 'needed',
    definition:
      'Largest excess of the cut, relative to its own maximum, over the pieces of the mask; zero or less is inside the mask.',
    at: (point, context) =>
      inCut(point, context, (_, cut) => {
        const mask = context.requirement.mask ?? [];
        if (mask.length === 0) return { missing: 'the requirement has no mask' };
        return finite(
          highestExcess(cut, mask, context.patternShift ?? 0),
          'a piece of the mask lies outside the evaluated cut',
        );
      }),
  },
  isolation: {
    title: 'Isolation of groups',
    unit: 'dB',
    cut: 'none',
    definition:
      'Least ratio of the wave into a column of one group to the wave that leaves a column of the other, all other columns terminated in the reference impedance, at the true edge of the first patch.',
    at: ({ scattering }, { board, requirement }) => {
      if (!scattering) return { missing: 'the coupling of columns was not evaluated there' };
      const pairs = columnPairs(board, requirement.between);
      if (pairs.length === 0) return { missing: 'the board has no two groups of columns to be isolated' };
      const largest = Math.max(...pairs.map(([m, n]) => Math.max(abs(scattering[m][n]), abs(scattering[n][m]))));
      return finite(
        -20 * Math.log10(Math.max(largest, SMALLEST_REFLECTION)),
        'the coupling of columns was not evaluated there',
      );
    },
  },
  line_loss: {
    title: 'Line loss',
    unit: 'dB/cm',
    cut: 'none',
    definition:
      'Attenuation of the feed line on this stack-up per centimetre, conductor and dielectric together, a cover layer included.',
    at: () => ({ missing: 'line loss is a figure of the line' }),
    onLine: (point) => finite(point.lossDbPerM / 100, 'line loss was not evaluated there'),
  },
  declared: {
    title: 'Declared property',
    unit: '',
    cut: 'none',
    definition: 'A property stated by a document and compared as it is stated; this program does not compute it.',
    at: () => ({ missing: 'a declared property is not computed' }),
  },
};

export const QUANTITIES: readonly Quantity[] = (Object.keys(CATALOGUE) as QuantityName[]).map((name) => ({
  name,
  ...CATALOGUE[name],
}));

export const quantityOf = (name: QuantityName): Quantity => ({ name, ...CATALOGUE[name] });

export interface Limit {
  readonly direction: 'at_least' | 'at_most';
  readonly value: number;
}

/**
 * The limit a computed value is compared with: as stated, or zero excess for a mask.
 * @throws RangeError when a computed quantity other than a mask carries no limit; the manifest reader refuses that.
 */
export function limitOf(requirement: Requirement): Limit {
  if (requirement.quantity === 'pattern_mask') return { direction: 'at_most', value: 0 };
  if (requirement.limit === undefined) throw new RangeError(`requirement ${requirement.id} has no limit`);
  return requirement.limit;
}

/** Distance of a value to its limit in the unit of the quantity: positive inside, negative outside. */
export const marginOf = (limit: Limit, value: number): number =>
  limit.direction === 'at_least' ? value - limit.value : limit.value - value;

/** Title of the quantity with its cut or property, for tables and sentences. */
export function quantityTitle(requirement: Requirement): string {
  const { title } = quantityOf(requirement.quantity);
  if (requirement.quantity === 'declared') return `${title}: ${requirement.property ?? 'not named'}`;
  return requirement.cut === undefined ? title : `${title}, ${requirement.cut} cut`;
}
