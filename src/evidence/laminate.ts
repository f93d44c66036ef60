import { debyePermittivity, laminateAt, widebandDebye } from '../physics/material/index.js';
import type { EvidenceCheck } from './check.js';

const TOPIC = 'Laminate';
const common = {
  topic: TOPIC,
  source:
    'A. R. Djordjević et al., IEEE Trans. Electromagn. Compat. 43(4), 2001; values computed separately from the formula',
  howKnown: 'memory',
  toleranceReason: 'half a unit of the last digit kept',
} as const;

/** Corners at which the reference was computed: 1e4 and 1e12 rad/s. */
const corners = { lower: 1e4, upper: 1e12 };

function reference(
  permittivity: number,
  lossTangent: number,
  high: number,
  step: number,
  at: readonly (readonly [number, number, number])[],
): EvidenceCheck[] {
  const model = widebandDebye({ permittivity, lossTangent, frequency: 10e9 }, corners);
  const words = `wideband Debye from ${permittivity}, ${lossTangent} at 10 GHz, upper corner 1e12 rad/s`;
  const check = (name: string, quantity: string, expected: number, tolerance: number, compute: () => number) => ({
    ...common,
    id: `laminate.debye-${name}-${permittivity}`,
    quantity: `${words}: ${quantity}`,
    unit: '1',
    expected,
    tolerance,
    compute,
  });
  return [
    check('high', 'permittivity far above', high, 5e-5, () => model.high),
    check('step', 'step of permittivity', step, 1e-4 * step, () => model.step),
    ...at.flatMap(([gigahertz, eps, tan]) => [
      check(
        `permittivity-${gigahertz}`,
        `permittivity at ${gigahertz} GHz`,
        eps,
        5.1e-5,
        () => debyePermittivity(model, gigahertz * 1e9).re,
      ),
      check(`loss-tangent-${gigahertz}`, `loss tangent at ${gigahertz} GHz`, tan, 1e-4 * tan, () => {
        const e = debyePermittivity(model, gigahertz * 1e9);
        return -e.im / e.re;
      }),
    ]),
  ];
}

export const laminateChecks: readonly EvidenceCheck[] = [
  ...reference(3, 0.0013, 2.9928, 0.047638, [
    [1, 3.0059, 0.001346],
    [77, 2.995, 0.00096727],
    [100, 2.9945, 0.00087211],
  ]),
  ...reference(3.55, 0.0027, 3.5324, 0.11708, [
    [1, 3.5646, 0.0027896],
    [77, 3.5377, 0.0020126],
    [100, 3.5364, 0.0018149],
  ]),
  {
    ...common,
    id: 'laminate.corner-fall',
    quantity: 'fall of the loss tangent from 10 to 77 GHz that an upper corner of 1e12 rad/s invents',
    unit: '%',
    expected: -26,
    tolerance: 0.5,
    compute: () =>
      100 *
      (laminateAt({ permittivity: 3, lossTangent: 0.0013, frequency: 10e9 }, { frequency: 77e9 }, {}, corners)
        .lossTangent /
        0.0013 -
        1),
  },
];
