import { z } from 'zod';

/** How the figures of the columns are confirmed, in the JSON data: see `data-schema.ts`. */
const value = z.number().nullable();
const text = z.string();

export const complexValue = z.strictObject({ re: value, im: value });
export const cutFigures = z.strictObject({
  beamDirectionRad: value,
  halfPowerBeamwidthRad: value,
  sidelobeDb: value,
});

export const matrix = z.array(z.array(complexValue)).describe('row = leaving, column = driven');

const engineFigures = z.strictObject({
  scattering: matrix,
  activeReflection: z.array(complexValue),
  directivity: value,
  radiationEfficiency: value,
  mismatch: value,
  elevation: cutFigures,
  azimuth: cutFigures,
  power: z
    .strictObject({ radiated: value, surfaceWave: value, metal: value, dielectric: value, load: value })
    .describe('fractions of the accepted power'),
  powerResidual: value,
  excitation: z
    .array(z.array(complexValue))
    .describe('current of every patch of every column over the largest of the board'),
});

export const confirmation = z.discriminatedUnion('kind', [
  z.strictObject({
    kind: z.literal('full wave'),
    carriedFrom: text.optional().describe('where the full wave ran on another state of the board: which one'),
    alignment: z
      .strictObject({ shiftHz: z.number(), remaining: value })
      .optional()
      .describe(
        'the network solved by the shift below each frequency fits best; what remains of complex reflections, rms',
      ),
    points: z.array(
      z.strictObject({
        frequencyHz: z.number(),
        referenceImpedanceOhm: z.array(value),
        fullWave: engineFigures,
        network: engineFigures,
        effort: z.strictObject({
          unknowns: z.number(),
          iterations: z.number(),
          residual: value.describe('power of ten above it'),
          cellLengthM: value,
          cellWidthM: value,
          misfitLengthM: value,
          misfitWidthM: value,
        }),
      }),
    ),
  }),
  z.strictObject({ kind: z.literal('network only'), reason: text }),
]);
