/** Checks of the full wave against resonances of rectangular patches: measured ones, and independent solutions. */
import { gapPatch } from '../physics/full-wave/index.js';
import { type EvidenceCheck, INDEPENDENT_FULL_WAVE } from './check.js';
import { sheetFaces } from './engine-problems.js';

const CHANG =
  'E. Chang, S. A. Long and W. F. Richards, IEEE Trans. Antennas Propag. 34(6), 1986: measured, fed by probes';
const KARA = 'M. Kara, Microw. Opt. Technol. Lett. 12(3), 1996: measured, fed by probes';

interface Patch {
  readonly lengthMm: number;
  readonly widthMm: number;
  readonly heightMm: number;
  readonly permittivity: number;
  readonly ghz: number;
}

/** Frequency in GHz at which a gap across the middle of the lossless patch sees no reactance, by the secant rule. */
function resonance({ lengthMm, widthMm, heightMm, permittivity, ghz }: Patch): number {
  const [low, high] = [0.97 * ghz, 1.03 * ghz];
  const solve = gapPatch(
    {
      length: lengthMm * 1e-3,
      width: widthMm * 1e-3,
      slab: { permittivity, lossTangent: 0, height: heightMm * 1e-3 },
    },
    { low: 0.95e9 * ghz, high: 1.05e9 * ghz },
  );
  const reactance = (f: number): number => solve(f * 1e9, sheetFaces('none', f * 1e9)).impedance.im;
  let [before, now] = [low, high];
  let [x, y] = [reactance(before), reactance(now)];
  for (let step = 0; step < 2; step++) {
    const next = now - (y * (now - before)) / (y - x);
    [before, now, x, y] = [now, next, y, reactance(next)];
  }
  return now - (y * (now - before)) / (y - x);
}

const check = (
  patch: Patch,
  tolerance: number,
  origin: Pick<EvidenceCheck, 'source' | 'howKnown' | 'toleranceReason'>,
): EvidenceCheck => ({
  ...origin,
  id: `patch.resonance-${patch.lengthMm}x${patch.widthMm}x${patch.heightMm}`,
  topic: 'Resonance of patches: full wave',
  quantity: `resonance of a patch ${patch.lengthMm} mm long and ${patch.widthMm} mm wide on ${patch.heightMm} mm of permittivity ${patch.permittivity}`,
  expected: patch.ghz,
  unit: 'GHz',
  tolerance: tolerance * patch.ghz,
  compute: () => resonance(patch),
});

const measured = (source: string) =>
  ({
    source,
    howKnown: 'memory',
    toleranceReason: '3 %: the probe’s reactance moves the reading, permittivity and etching are known to a per cent',
  }) as const;
const solved = {
  source: INDEPENDENT_FULL_WAVE,
  howKnown: 'independent solution',
  toleranceReason: '0.25 % asked of the engine and 0.2 % of the reference, root of sum of squares',
} as const;

export const patchResonanceChecks: readonly EvidenceCheck[] = [
  ...(
    [
      [38, 57, 3.175, 2.31],
      [30.5, 45.5, 3.175, 2.89],
      [19.5, 29.5, 3.175, 4.24],
      [11, 17, 1.524, 7.87],
    ] as const
  ).map(([lengthMm, widthMm, heightMm, ghz]) =>
    check({ lengthMm, widthMm, heightMm, permittivity: 2.33, ghz }, 0.03, measured(CHANG)),
  ),
  check({ lengthMm: 25, widthMm: 20, heightMm: 0.79, permittivity: 2.22, ghz: 3.97 }, 0.03, measured(KARA)),
  check({ lengthMm: 1.013, widthMm: 1.25, heightMm: 0.127, permittivity: 3, ghz: 77.053 }, 0.0032, solved),
  check({ lengthMm: 1.055, widthMm: 0.5, heightMm: 0.1, permittivity: 3.16, ghz: 77.419 }, 0.0032, solved),
  check({ lengthMm: 0.875, widthMm: 1.1, heightMm: 0.2, permittivity: 3.55, ghz: 77.454 }, 0.0032, solved),
];
