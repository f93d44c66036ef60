import { z } from 'zod';
import { boardDocument } from './documents/board-document.js';
import { finishesDocument, foilsDocument, laminatesDocument } from './documents/library-documents.js';
import { packDocument } from './documents/pack-document.js';
import { procurementDocument } from './documents/procurement-document.js';
import { requirementsDocument } from './documents/requirement-document.js';
import { reviewDocument } from './documents/review-document.js';
import { variantDocument } from './documents/variant-document.js';

type JsonSchema = Record<string, unknown>;

function exported(schema: z.ZodType): JsonSchema {
  const { $schema: _dialect, ...rest } = z.toJSONSchema(schema, { target: 'draft-2020-12', io: 'input' }) as JsonSchema;
  return rest;
}

const document = (title: string, body: JsonSchema): JsonSchema => ({
  $schema: 'https://json-schema.org/draft/2020-12/schema',
  title,
  ...body,
});

/**
 * JSON Schemas of all manifests by file name, for editors. They are exported from the documents that also check the
 * manifests; what JSON Schema cannot say (plausible ranges, references, counts that must agree) only `validate` finds.
 */
export function manifestSchemas(): Record<string, object> {
  return {
    'board.schema.json': document('Board', {
      type: 'object',
      if: { required: ['based_on'] },
      // biome-ignore lint/suspicious/noThenProperty: a JSON Schema keyword
      then: exported(variantDocument),
      else: exported(boardDocument),
    }),
    'finishes.schema.json': document('Finishes', exported(finishesDocument)),
    'foils.schema.json': document('Foils', exported(foilsDocument)),
    'laminates.schema.json': document('Laminates', exported(laminatesDocument)),
    'pack.schema.json': document('Pack', exported(packDocument)),
    'procurement.schema.json': document('Procurement', exported(procurementDocument)),
    'requirements.schema.json': document('Requirement set', exported(requirementsDocument)),
    'review.schema.json': document('Review', exported(reviewDocument)),
  };
}

/** Text of a schema file, as committed. */
export const schemaText = (schema: object): string => `${JSON.stringify(schema, null, 2)}\n`;
