/**
 * The units that people write, by dimension. The only table of conversion factors in the program.
 *
 * One unit means `number × multiplier × 10^power + offset` in the unit named by `base`. Powers of ten are kept apart
 * from the multiplier so that `127 um` becomes the double nearest to 127e-6, without a rounding of its own.
 * Factors: SI brochure (9th ed., BIPM 2019); the inch is 25.4 mm exactly.
 */
export type Dimension =
  | 'length'
  | 'frequency'
  | 'temperature'
  | 'temperature_difference'
  | 'temperature_coefficient'
  | 'angle'
  | 'level'
  | 'gain'
  | 'loss_per_length'
  | 'conductivity'
  | 'resistance'
  | 'per_area'
  | 'ratio';

export interface Unit {
  /** First the spelling suggested to people who type, then the others accepted. */
  readonly spellings: readonly string[];
  /** How it is printed. */
  readonly symbol: string;
  readonly power: number;
  readonly multiplier?: number;
  readonly offset?: number;
}

export interface DimensionInfo {
  /** With article, for messages: `a length`. */
  readonly noun: string;
  /** The unit of the number inside the program. */
  readonly base: string;
  /** In order of likelihood: the first that fits a plausible range is the one suggested. */
  readonly units: readonly Unit[];
  /** True when a plain number is complete. */
  readonly bareNumber: boolean;
}

const unit = (
  symbol: string,
  spellings: readonly string[],
  power: number,
  rest: { multiplier?: number; offset?: number } = {},
): Unit => ({ symbol, spellings, power, ...rest });

const INCH = 25.4; // mm, exact

export const DIMENSIONS: Readonly<Record<Dimension, DimensionInfo>> = {
  length: {
    noun: 'a length',
    base: 'm',
    bareNumber: false,
    units: [
      unit('µm', ['um', 'µm', 'μm'], -6),
      unit('mm', ['mm'], -3),
      unit('mil', ['mil', 'mils'], -6, { multiplier: INCH }),
      unit('nm', ['nm'], -9),
      unit('cm', ['cm'], -2),
      unit('in', ['in', 'inch'], -3, { multiplier: INCH }),
      unit('m', ['m'], 0),
    ],
  },
  frequency: {
    noun: 'a frequency',
    base: 'Hz',
    bareNumber: false,
    units: [
      unit('GHz', ['GHz'], 9),
      unit('MHz', ['MHz'], 6),
      unit('THz', ['THz'], 12),
      unit('kHz', ['kHz'], 3),
      unit('Hz', ['Hz'], 0),
    ],
  },
  temperature: {
    noun: 'a temperature',
    base: 'degC',
    bareNumber: false,
    units: [unit('°C', ['degC', '°C', '℃'], 0), unit('K', ['K'], 0, { offset: -273.15 })],
  },
  temperature_difference: {
    noun: 'a difference of temperatures',
    base: 'K',
    bareNumber: false,
    units: [unit('K', ['K', 'degC', '°C'], 0)],
  },
  temperature_coefficient: {
    noun: 'a relative change per kelvin',
    base: '1/K',
    bareNumber: false,
    units: [
      unit('ppm/K', ['ppm/K', 'ppm/degC', 'ppm/°C'], -6),
      unit('%/K', ['%/K', '%/degC', '%/°C'], -2),
      unit('1/K', ['1/K', '1/degC', '1/°C'], 0),
    ],
  },
  angle: {
    noun: 'an angle',
    base: 'rad',
    bareNumber: false,
    units: [unit('°', ['deg', '°'], 0, { multiplier: Math.PI / 180 }), unit('rad', ['rad'], 0)],
  },
  level: { noun: 'a level', base: 'dB', bareNumber: false, units: [unit('dB', ['dB'], 0)] },
  gain: {
    noun: 'a gain over an isotropic radiator',
    base: 'dBi',
    bareNumber: false,
    units: [unit('dBi', ['dBi'], 0)],
  },
  loss_per_length: {
    noun: 'a loss per length',
    base: 'dB/m',
    bareNumber: false,
    units: [
      unit('dB/cm', ['dB/cm'], 2),
      unit('dB/mm', ['dB/mm'], 3),
      unit('dB/in', ['dB/in', 'dB/inch'], 3, { multiplier: 1 / INCH }),
      unit('dB/m', ['dB/m'], 0),
    ],
  },
  conductivity: {
    noun: 'a conductivity',
    base: 'S/m',
    bareNumber: false,
    units: [unit('MS/m', ['MS/m'], 6), unit('S/m', ['S/m'], 0)],
  },
  resistance: {
    noun: 'a resistance',
    base: 'ohm',
    bareNumber: false,
    units: [
      unit('Ω', ['ohm', 'Ω', 'Ω', 'ohms'], 0), // Greek capital omega and U+2126
      unit('kΩ', ['kohm', 'kΩ', 'kΩ'], 3),
      unit('mΩ', ['mohm', 'mΩ', 'mΩ'], -3),
    ],
  },
  per_area: {
    noun: 'a number per area',
    base: '1/m²',
    bareNumber: false,
    units: [
      unit('1/µm²', ['1/um2', '1/µm²', '1/μm²', '1/um²', '1/µm2'], 12),
      unit('1/mm²', ['1/mm2', '1/mm²'], 6),
      unit('1/m²', ['1/m2', '1/m²'], 0),
    ],
  },
  ratio: { noun: 'a ratio', base: '1', bareNumber: true, units: [unit('%', ['%', 'percent'], -2)] },
};

/** The unit of a dimension that has this exact spelling. */
export function unitNamed(dimension: Dimension, spelling: string): Unit | undefined {
  return DIMENSIONS[dimension].units.find((u) => u.spellings.includes(spelling));
}

/** Number of the base unit from a decimal text (ASCII, as `Number` reads it) in a unit. */
export function toBase(decimal: string, u: Unit | undefined): number {
  if (u === undefined) return Number(decimal);
  const [mantissa = '', exponent = '0'] = decimal.toLowerCase().split('e');
  const scaled = Number(`${mantissa}e${Number(exponent) + u.power}`);
  return scaled * (u.multiplier ?? 1) + (u.offset ?? 0);
}

/** Number in a unit from the base unit; the inverse of {@link toBase} up to rounding. */
export function fromBase(value: number, u: Unit): number {
  const inUnit = (value - (u.offset ?? 0)) / (u.multiplier ?? 1);
  // Dividing by a positive power of ten is exact in the factor; multiplying by 1e-6 is not.
  return u.power >= 0 ? inUnit / 10 ** u.power : inUnit * 10 ** -u.power;
}

/** dB per neper: 20 / ln 10, for amplitude ratios. */
export const DB_PER_NEPER = 20 / Math.LN10;
/** Attenuation constant in Np/m from a loss in dB/m. */
export const nepersFromDb = (db: number): number => db / DB_PER_NEPER;
/** Loss in dB/m from an attenuation constant in Np/m. */
export const dbFromNepers = (nepers: number): number => nepers * DB_PER_NEPER;
