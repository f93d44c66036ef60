import { z } from 'zod';
import { complexValue, confirmation, cutFigures, matrix } from './confirmation-schema.js';

/**
 * Shape of the JSON data of a pack: the one source of the TypeScript types, of the check before writing and of the JSON
 * Schema beside the files. Numbers are SI unless their name says otherwise, with 12 significant digits; `null` stands
 * where a value does not exist or was not evaluated.
 */
const value = z.number().nullable();
const text = z.string();

const place = z.strictObject({ frequencyHz: z.number(), temperatureC: z.number() });
const status = z.enum(['meets', 'undecided', 'misses', 'not evaluated', 'open until measured']);

/** Low, middle and high estimate of a rough face for what is known of its texture. */
const side = z.enum(['low', 'middle', 'high']);

const part = z.strictObject({
  id: text,
  kind: z.enum(['engine', 'roughness', 'tolerance']),
  label: text,
  detail: text,
  adverse: z.number().describe('how far the margin may be smaller, ≥ 0'),
  favourable: z.number().describe('how far the margin may be larger, ≥ 0'),
  atLimits: z.strictObject({ low: z.number(), high: z.number() }).optional(),
});

const verdict = z.strictObject({
  boardId: text,
  requirementId: text,
  status,
  calculated: z.enum(['meets', 'undecided', 'misses', 'not evaluated']).optional(),
  unit: text.describe('unit of value, limit, margin and uncertainty; 1 for a ratio'),
  value: z.union([z.number(), z.string()]).nullable(),
  where: place.nullable(),
  margin: value.describe('distance to the limit, positive inside'),
  adverse: value,
  favourable: value,
  parts: z.array(part),
  bySide: z
    .array(z.strictObject({ side, value: z.number(), margin: z.number() }))
    .describe('worst value and margin under each estimate of the roughness band'),
  reason: text.optional(),
});

const span = z.strictObject({ low: z.number(), high: z.number() });
const condition = z.strictObject({ bandHz: span.optional(), temperatureC: span.optional() });

const requirement = z.strictObject({
  id: text,
  text,
  quantity: text,
  cut: text.optional(),
  between: z.array(text).optional().describe('of an isolation: the two groups; absent: any two'),
  unit: text,
  limit: z.strictObject({ direction: z.enum(['at_least', 'at_most']), value: z.number() }).optional(),
  mask: z.array(z.strictObject({ fromRad: z.number(), toRad: z.number(), levelDb: z.number() })).optional(),
  property: text.optional(),
  allowed: z.array(text).optional(),
  condition: condition.optional().describe("absent parts are the board's own"),
  weight: z.enum(['binding', 'target']),
  verification: z.enum(['calculation', 'test']),
  source: text,
});

const header = {
  program: z.literal('boardcase'),
  programVersion: text,
  marking: text.describe('who may see the data'),
  notices: z.array(text).describe('cautions that go with the data'),
};

const day = text.describe('YYYY-MM-DD');
const maybeText = text.nullable();

const review = z
  .strictObject({
    decision: z
      .strictObject({
        board: maybeText.describe('null: no board is chosen'),
        statement: text,
        reason: text,
        date: day,
        by: text,
      })
      .nullable(),
    openPoints: z.array(
      z.strictObject({ id: text, text, owner: text, due: day, status: z.enum(['open', 'in work', 'closed']) }),
    ),
    concessions: z.array(
      z.strictObject({
        number: text,
        board: text,
        requirement: text,
        text,
        approver: text,
        granted: day,
        expiry: day,
      }),
    ),
    approvals: z.array(
      z.strictObject({
        role: text,
        name: maybeText,
        organisation: text,
        date: day.nullable(),
        attests: text,
      }),
    ),
    revisions: z.array(z.strictObject({ revision: text, date: day, author: text, change: text })),
  })
  .describe('what people decided; it changes no verdict');

const previous = z
  .strictObject({ revision: text, date: day, status: text, programVersion: text, sha256: text })
  .describe('revision whose data this one was compared with, and the SHA-256 of those data');

const evidence = z.strictObject({
  id: text,
  topic: text,
  quantity: text,
  source: text,
  howKnown: text,
  unit: text,
  expected: value,
  value,
  deviation: value,
  tolerance: value,
  ok: z.boolean(),
});

export const packDataSchema = z
  .strictObject({
    ...header,
    kind: z.literal('pack'),
    pack: z.strictObject({
      id: text,
      title: text,
      documentNumber: text,
      revision: text,
      date: text,
      status: text,
      authors: z.array(text),
      owner: text,
    }),
    boards: z.array(
      z.strictObject({
        id: text,
        title: text,
        overall: z.enum(['meets', 'undecided', 'misses', 'open until measured', 'incomplete']),
        reason: text,
        inputsHash: text,
        cost: z.strictObject({ amount: z.number(), currency: text }).nullable(),
        data: text.describe('name of the file with the results of the board, beside this one'),
      }),
    ),
    previous: previous.nullable(),
    review: review.nullable(),
    requirements: z.array(requirement),
    verdicts: z.array(verdict),
    evidence: z.array(evidence),
    inputs: z.array(z.strictObject({ path: text, sha256: text })),
  })
  .describe('Verdicts of a pack of boards: calculated design evidence, not a declaration of conformity');

const cut = z.strictObject({ angleRad: z.array(z.number()), gainDbi: z.array(value) });

const point = z.strictObject({
  frequencyHz: z.number(),
  temperatureC: z.number(),
  directivity: value.describe('ratio'),
  gain: value.describe('ratio, at the input of the feed network, without mismatch'),
  realizedGain: value.describe('ratio'),
  radiationEfficiency: value,
  feedTransmission: value,
  mismatch: value.describe('1 less reflected over incident power, all columns driven'),
  shares: z.record(text, value).describe('fractions of the power accepted at the column ports; they sum to 1'),
  columnReflection: z.array(complexValue),
  activeReflection: z.array(complexValue),
  referenceImpedanceOhm: z.array(value),
  elevation: cutFigures,
  azimuth: cutFigures,
  powerResidual: value.describe('power of ten above the residual of the circuit, over the input power'),
  farFieldClosure: value,
  scattering: matrix.optional(),
  feed: z
    .strictObject({ inputReflection: complexValue, transmission: value, burnt: value })
    .optional()
    .describe('feed network at its input; transmission and burnt power over the power accepted there'),
});

const linePoint = z.strictObject({
  frequencyHz: z.number(),
  temperatureC: z.number(),
  lossDbPerM: value,
  effectivePermittivity: value,
  impedanceOhm: value,
});

const curves = z.strictObject({
  x: z.array(z.number()),
  curves: z.array(z.strictObject({ model: text, y: z.array(value) })),
  band: z.strictObject({ low: z.array(value), middle: z.array(value), high: z.array(value) }),
});

const faceFigures = {
  lossFactor: value,
  reactance: value.describe('in units of the smooth surface resistance, to the mean plane'),
  planeShiftM: value,
  slowWaveLengthM: value,
};

const face = z.strictObject({
  face: text,
  place: z.enum(['underside', 'ground', 'outer']),
  rqM: value,
  skinDepthM: value,
  known: text.describe('what is known of the texture'),
  band: z.array(z.strictObject({ side, ...faceFigures, reason: text })),
  models: z.array(z.strictObject({ model: text, ...faceFigures, outOfRange: z.array(text) })),
  narrowing: z
    .array(z.strictObject({ quantity: text, measurement: text, spreadNow: value, wouldNarrowTo: value }))
    .describe('measurements that would narrow the band of the loss factor, the most useful first'),
  saturation: z.array(z.strictObject({ model: text, text })),
});

const lossByFace = z.strictObject({
  side,
  faces: z.array(
    z.strictObject({
      face: z.enum(['underside', 'top', 'edges', 'ground']),
      smoothDbPerM: value,
      finishDbPerM: value,
      textureDbPerM: value,
    }),
  ),
  dielectricDbPerM: value,
  totalDbPerM: value,
  effectivePermittivity: value,
  impedanceOhm: value,
});

const slowing = z.strictObject({
  side,
  lineRise: value.describe('relative rise of the effective permittivity of the feed line'),
  patchRise: value,
  resonanceShiftHz: value,
  tiltShiftRad: value,
  applied: z.boolean().describe('false where the permittivity is a design value, which holds the effect already'),
});

export const boardDataSchema = z
  .strictObject({
    ...header,
    kind: z.literal('board'),
    packId: text,
    revision: text,
    boardId: text,
    title: text,
    inputsHash: text,
    retuning: z
      .strictObject({
        factor: z.number().describe('of every patch and link length of the drawing'),
        drawnReflectionDb: z.number(),
        reflectionDb: z.number(),
      })
      .optional()
      .describe('where the results are of a retuned layout: passive reflection of the worst column at the band centre'),
    nominalRoughness: text.describe('band: the middle estimate; otherwise the model named in the analysis'),
    nominal: z.array(point).describe('empty where the columns were not evaluated'),
    nominalLine: z.array(linePoint).describe('feed line of the first column'),
    sides: z.array(z.strictObject({ side, points: z.array(point), line: z.array(linePoint) })),
    cuts: z
      .array(z.strictObject({ frequencyHz: z.number(), temperatureC: z.number(), elevation: cut, azimuth: cut }))
      .describe('at the band edges and the band centre, nominal temperature'),
    lineLossDbPerM: curves.describe('over Hz'),
    lossFactor: curves.describe('over Rq in m'),
    effectivePermittivity: curves.describe('of the feed line, over Rq in m of both faces to the laminate'),
    lineLossByFace: z.array(lossByFace).describe('at the band centre and nominal temperature'),
    slowWave: z.array(slowing).describe('against smooth faces, at the band centre'),
    faces: z.array(face),
    flags: z.array(z.strictObject({ code: text, severity: text, model: text, text })),
    notEvaluated: z.array(z.strictObject({ quantities: z.array(text), reason: text })),
    losslessClosure: value,
    confirmation: confirmation.describe('how the figures of the columns are confirmed'),
    sizing: z
      .strictObject({ by: z.enum(['network', 'full wave']), networkReflectionDb: value, fullWaveReflectionDb: value })
      .optional()
      .describe('where the columns were sized by the program: reflection at the frequency asked for'),
    verdicts: z.array(verdict),
  })
  .describe('Results of one board: calculated design evidence, not a declaration of conformity');

export type PackData = z.infer<typeof packDataSchema>;
export type BoardData = z.infer<typeof boardDataSchema>;
export type VerdictData = z.infer<typeof verdict>;
export type ConditionData = z.infer<typeof condition>;
export type PointData = z.infer<typeof point>;

const file = (schema: z.ZodType, title: string): object => ({
  ...z.toJSONSchema(schema, { target: 'draft-2020-12', io: 'input' }),
  title,
});

/** JSON Schema of the data files, by the name under which it stands beside them. */
export const dataSchemas = (): Readonly<Record<string, object>> => ({
  'data/pack.schema.json': file(packDataSchema, 'Data of a pack'),
  'data/board.schema.json': file(boardDataSchema, 'Data of a board'),
});
