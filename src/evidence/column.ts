/** Checks of both column engines against independent solutions of columns and edge-fed patches. */
import type { EvidenceCheck } from './check.js';
import { type ColumnComparison, columnComparisons, heightUm } from './column-comparison.js';
import { type EngineName, MPIE, rms } from './engine-problems.js';
import { edgeResonances, type ResonanceComparison } from './patch-comparison.js';

interface Tolerance {
  readonly tolerance: number;
  readonly toleranceReason: string;
}

const ENGINES: Readonly<
  Record<
    EngineName,
    {
      readonly prefix: string;
      readonly topic: string;
      readonly reflection: Tolerance;
      readonly gain: Tolerance;
      readonly tilt: Tolerance;
      readonly sidelobe: Tolerance;
      readonly resonancePercent: Tolerance;
    }
  >
> = {
  network: {
    prefix: 'column',
    topic: 'Patch columns: network against full wave',
    reflection: {
      tolerance: 0.08,
      toleranceReason: '0.06 asked of the network and 0.02 of the reference, added',
    },
    gain: {
      tolerance: 0.35,
      toleranceReason: '0.25 dB asked of the network and 0.1 dB of the reference, added',
    },
    tilt: {
      tolerance: 0.65,
      toleranceReason: '0.5° asked of the network and 0.15° from the 0.5° grid of the reference, added',
    },
    sidelobe: {
      tolerance: 1.5,
      toleranceReason: '1 dB asked of the network and 0.5 dB of the reference above −20 dB, added',
    },
    resonancePercent: {
      tolerance: 0.5,
      toleranceReason: '0.3 % asked of the network and 0.2 % of the reference, added',
    },
  },
  'full wave': {
    prefix: 'full-wave',
    topic: 'Patch columns: full-wave engine against independent full wave',
    reflection: {
      tolerance: 0.05,
      toleranceReason: '0.03 asked of the engine and 0.02 of the reference, added',
    },
    gain: {
      tolerance: 0.25,
      toleranceReason: '0.15 dB asked of the engine and 0.1 dB of the reference, added',
    },
    tilt: {
      tolerance: 0.65,
      toleranceReason: '0.5° asked of the engine and 0.15° from the 0.5° grid of the reference, added',
    },
    sidelobe: {
      tolerance: 1,
      toleranceReason: '0.5 dB asked of the engine and 0.5 dB of the reference above −20 dB, added',
    },
    resonancePercent: {
      tolerance: 0.45,
      toleranceReason: '0.25 % asked of the engine and 0.2 % of the reference, added',
    },
  },
};

const shared = { source: MPIE, howKnown: 'independent solution' } as const;

const CASES = [
  [127, 'smooth', 'eight uniform patches on 127 µm, permittivity 3.0, smooth copper'],
  [127, 'rough', 'eight uniform patches on 127 µm, permittivity 3.0, rough copper'],
  [100, 'smooth', 'eight uniform patches on 100 µm, permittivity 3.16, smooth copper'],
  [100, 'rough', 'eight uniform patches on 100 µm, permittivity 3.16, rough copper'],
] as const;

function columnChecks(engine: EngineName): EvidenceCheck[] {
  const { prefix, topic, ...limits } = ENGINES[engine];
  return CASES.filter(([height, copper]) => engine === 'network' || height === 127 || copper === 'smooth').flatMap(
    ([height, copper, where]) => {
      const check = (
        id: string,
        quantity: string,
        unit: string,
        limit: Tolerance,
        of: (c: ColumnComparison) => number,
      ): EvidenceCheck => ({
        ...shared,
        ...limit,
        id: `${prefix}.${id}-${height}-${copper}`,
        topic,
        quantity: `${quantity}, ${where}`,
        expected: 0,
        unit,
        compute: () => {
          const found = columnComparisons[engine]().find(
            (c) => heightUm(c.reference) === height && c.copper === copper,
          );
          if (!found) throw new Error(`no comparison on ${height} µm with ${copper} copper`);
          return of(found);
        },
      });
      return [
        check('reflection', 'rms difference of complex reflection', '1', limits.reflection, (c) =>
          rms(c.rows.map((row) => row.reflection)),
        ),
        check('directivity', 'rms difference of directivity', 'dB', limits.gain, (c) =>
          rms(c.rows.map((row) => row.directivityDb)),
        ),
        check('gain', 'rms difference of gain where reflection is below −5 dB', 'dB', limits.gain, gainDifference),
        check('tilt', 'rms difference of beam direction', '°', limits.tilt, (c) =>
          rms(c.rows.map((row) => row.tiltDeg)),
        ),
        check('sidelobe', 'rms difference of the elevation sidelobe level', 'dB', limits.sidelobe, (c) =>
          rms(c.rows.map((row) => row.sidelobeDb)),
        ),
      ];
    },
  );
}

export function gainDifference({ rows }: ColumnComparison): number {
  return rms(rows.filter((row) => row.reflectionDb < -5).map((row) => row.gainDb));
}

const HEIGHTS = [127, 100, 200] as const;

function resonanceChecks(engine: EngineName): EvidenceCheck[] {
  const { prefix, topic, resonancePercent } = ENGINES[engine];
  return HEIGHTS.map((height): EvidenceCheck => {
    const found = (): ResonanceComparison => {
      const match = edgeResonances[engine]().find((c) => heightUm(c.reference) === height && c.copper === 'none');
      if (!match) throw new Error(`no reference patch on ${height} µm`);
      return match;
    };
    return {
      ...shared,
      id: `${prefix}.patch-resonance-${height}`,
      topic,
      quantity: `resonance of an edge-fed patch on ${height} µm without loss, over the reference’s`,
      expected: 0,
      unit: '%',
      tolerance: resonancePercent.tolerance,
      toleranceReason: resonancePercent.toleranceReason,
      compute: () => {
        const { found: fit, expected } = found();
        return 100 * (fit.f0GHz / expected.f0GHz - 1);
      },
    };
  });
}

export const columnEngineChecks: readonly EvidenceCheck[] = (['network', 'full wave'] as const).flatMap((engine) => [
  ...columnChecks(engine),
  ...resonanceChecks(engine),
]);
