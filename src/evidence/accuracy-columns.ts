/** How close both column engines come to independent solutions. */
import { type AccuracyClaim, percent } from './accuracy-claim.js';
import { gainDifference } from './column.js';
import { bestShift, columnComparisons, couplingDifferences, roughGainDifferences } from './column-comparison.js';
import { type EngineName, rms } from './engine-problems.js';
import { edgeResonances, unitDifference } from './patch-comparison.js';
import { UNIT_REFERENCES } from './patch-references.js';

const COLUMNS = 'independent full-wave solutions of two columns';
const PATCHES = 'independent full-wave solutions of edge-fed patches';
const UNITS = 'independent full-wave solutions of one patch between two lines';
const EIGHT =
  'eight patches on 127 µm and on 100 µm, smooth and rough copper, 76 to 80 GHz (full wave: 76, 78, 80 and 77, 79 GHz, rough 78 GHz on 127 µm)';
const THREE = 'patches on 100, 127 and 200 µm, permittivity 3 to 3.55, 78 to 80 GHz';

/** Frequencies compared, GHz: the network at all, the full wave at a few that show the match, the slope and the dip. */
const COUPLED: Readonly<Record<EngineName, readonly number[]>> = {
  network: [76, 76.5, 77, 77.5, 78, 78.5, 79, 79.5, 80],
  'full wave': [78],
};
const BETWEEN: Readonly<Record<EngineName, readonly number[]>> = { network: [70, 74, 78, 82], 'full wave': [78] };

interface Target {
  readonly network: number;
  readonly 'full wave': number;
}

interface Row {
  readonly id: string;
  readonly figure: string;
  readonly comparedWith: string;
  readonly range: string;
  readonly target: Target;
  readonly unit: string;
  readonly remark?: Partial<Readonly<Record<EngineName, string>>>;
  readonly deviations: (engine: EngineName) => readonly number[];
}

const resonant = (engine: EngineName, of: 'f0GHz' | 'ohm' | 'q', thick: boolean): number[] =>
  edgeResonances[engine]()
    .filter((c) => of === 'f0GHz' || c.reference.height > 150e-6 === thick)
    .map((c) => percent(c.found[of], c.expected[of]));

const perColumn = (
  engine: EngineName,
  of: 'reflection' | 'directivityDb' | 'tiltDeg' | 'sidelobeDb',
): readonly number[] => columnComparisons[engine]().map((c) => rms(c.rows.map((row) => row[of])));

const ROWS: readonly Row[] = [
  {
    id: 'patch-resonance',
    figure: 'resonance of an edge-fed patch',
    comparedWith: PATCHES,
    range: THREE,
    target: { network: 0.3, 'full wave': 0.25 },
    unit: '%',
    remark: both('The references are known to 0.2 %.'),
    deviations: (engine) => resonant(engine, 'f0GHz', false),
  },
  {
    id: 'patch-resistance',
    figure: 'edge resistance of a patch at resonance',
    comparedWith: PATCHES,
    range: '100 and 127 µm',
    target: { network: 12, 'full wave': 4 },
    unit: '%',
    remark: both('The references are known to 3 %.'),
    deviations: (engine) => resonant(engine, 'ohm', false),
  },
  {
    id: 'patch-resistance-200',
    figure: 'edge resistance of a patch at resonance, thick slab',
    comparedWith: PATCHES,
    range: '200 µm, permittivity 3.55',
    target: { network: 12, 'full wave': 7 },
    unit: '%',
    remark: both('The references are known to 6 %.'),
    deviations: (engine) => resonant(engine, 'ohm', true),
  },
  {
    id: 'patch-quality',
    figure: 'quality factor of an edge-fed patch',
    comparedWith: PATCHES,
    range: '100 and 127 µm',
    target: { network: 12, 'full wave': 4 },
    unit: '%',
    deviations: (engine) => resonant(engine, 'q', false),
  },
  {
    id: 'patch-quality-200',
    figure: 'quality factor of an edge-fed patch, thick slab',
    comparedWith: PATCHES,
    range: '200 µm, permittivity 3.55',
    target: { network: 12, 'full wave': 7 },
    unit: '%',
    deviations: (engine) => resonant(engine, 'q', true),
  },
  {
    id: 'unit',
    figure: 'complex reflection of a patch between two lines, rms over frequency',
    comparedWith: UNITS,
    range: '100 and 127 µm, 70 to 82 GHz (full wave: 78 GHz)',
    target: { network: 0.06, 'full wave': 0.03 },
    unit: '1',
    deviations: (engine) => units(engine, false),
  },
  {
    id: 'unit-200',
    figure: 'complex reflection of a patch between two lines, rms over frequency, thick slab',
    comparedWith: UNITS,
    range: '200 µm, permittivity 3.55, 70 to 82 GHz (full wave: 78 GHz)',
    target: { network: 0.1, 'full wave': 0.04 },
    unit: '1',
    deviations: (engine) => units(engine, true),
  },
  {
    id: 'reflection',
    figure: 'complex reflection, rms over the band',
    comparedWith: COLUMNS,
    range: EIGHT,
    target: { network: 0.06, 'full wave': 0.03 },
    unit: '1',
    remark: both('The references are known to 0.02.'),
    deviations: (engine) => perColumn(engine, 'reflection'),
  },
  {
    id: 'shift',
    figure: 'frequency shift that best aligns the complex reflection',
    comparedWith: COLUMNS,
    range: 'eight patches on 127 µm and on 100 µm, smooth copper, 76 to 80 GHz',
    target: { network: 0.2, 'full wave': 0.1 },
    unit: 'GHz',
    deviations: (engine) =>
      columnComparisons[engine]()
        .filter((c) => c.copper === 'smooth')
        .map(bestShift),
  },
  {
    id: 'directivity',
    figure: 'directivity, rms',
    comparedWith: COLUMNS,
    range: EIGHT,
    target: { network: 0.25, 'full wave': 0.15 },
    unit: 'dB',
    deviations: (engine) => perColumn(engine, 'directivityDb'),
  },
  {
    id: 'gain',
    figure: 'gain where reflection is below −5 dB, rms',
    comparedWith: COLUMNS,
    range: EIGHT,
    target: { network: 0.25, 'full wave': 0.15 },
    unit: 'dB',
    remark: both('What the references themselves fail to balance is taken off theirs; they are known to 0.1 dB.'),
    deviations: (engine) => columnComparisons[engine]().map(gainDifference),
  },
  {
    id: 'rough-gain',
    figure: 'gain lost to rough copper',
    comparedWith: COLUMNS,
    range: 'sheet impedance (2 + 3j)Rs against (1 + j)Rs, where reflection is below −5 dB',
    target: { network: 0.1, 'full wave': 0.05 },
    unit: 'dB',
    deviations: roughGainDifferences,
  },
  {
    id: 'tilt',
    figure: 'beam direction at a given frequency, rms',
    comparedWith: COLUMNS,
    range: EIGHT,
    target: { network: 0.5, 'full wave': 0.5 },
    unit: '°',
    remark: both('The references give it on a grid of 0.5°.'),
    deviations: (engine) => perColumn(engine, 'tiltDeg'),
  },
  {
    id: 'sidelobe',
    figure: 'strongest elevation sidelobe, rms',
    comparedWith: COLUMNS,
    range: `${EIGHT}; sidelobes of −4 to −13 dB`,
    target: { network: 1, 'full wave': 0.5 },
    unit: 'dB',
    remark: both('Columns tapered to −25 dB are not among the references printed here.'),
    deviations: (engine) => perColumn(engine, 'sidelobeDb'),
  },
  {
    id: 'coupling',
    figure: 'coupling of two neighbouring columns, rms',
    comparedWith: 'independent full-wave solution of two columns 0.55 wavelengths apart',
    range: 'eight patches on 127 µm, smooth copper, −27 to −37 dB, 76 to 80 GHz (full wave: 78 GHz)',
    target: { network: 1.5, 'full wave': 0.5 },
    unit: 'dB',
    remark: {
      network:
        'Missed: 2.6 dB; overstated by 3 to 4 dB below 78 GHz, where the columns reflect most, and within 1.8 dB above 78.5 GHz.',
      'full wave':
        'Both solutions are driven over feed lines that radiate a little; another length of line moves the figure by 1 dB. The reference is known to 0.2 dB.',
    },
    deviations: (engine) => [rms(couplingDifferences(engine, COUPLED[engine]))],
  },
];

function both(remark: string): Readonly<Record<EngineName, string>> {
  return { network: remark, 'full wave': remark };
}

function units(engine: EngineName, thick: boolean): number[] {
  return UNIT_REFERENCES.filter((reference) => reference.height > 150e-6 === thick).map((reference) =>
    rms(unitDifference(engine, reference, BETWEEN[engine]).map((d) => d.reflection)),
  );
}

export const columnAccuracy: readonly AccuracyClaim[] = (['network', 'full wave'] as const).flatMap((engine) =>
  ROWS.map(
    ({ id, figure, target, remark, deviations, ...row }): AccuracyClaim => ({
      ...row,
      id: `${engine === 'network' ? 'column' : 'full-wave'}-${id}`,
      figure: `Patch columns, ${engine}: ${figure}`,
      target: target[engine],
      ...(remark?.[engine] ? { remark: remark[engine] } : {}),
      deviations: () => deviations(engine),
    }),
  ),
);
