import { z } from 'zod';
import { quantityPattern } from '../../quantity/index.js';
import { QUANTITY_NAMES, REQUIREMENT_QUANTITIES } from '../requirement-quantities.js';
import { exactlyOne, id, invented, quantity, range, text } from './fields.js';

const side = (what: string) =>
  z
    .union([z.number(), text('Number with unit.')])
    .describe(
      `${what} Number with the unit of the quantity (dBi, dB, deg, dB/cm; a plain number or % for an efficiency).`,
    )
    .optional();

const angle = (what: string) => quantity('angle', what, range(-Math.PI / 2, Math.PI / 2, 'an angle of a mask', 'deg'));
const frequency = (what: string) =>
  quantity('frequency', what, range(1e9, 300e9, 'the frequency of a requirement', 'GHz'));
const temperature = (what: string) =>
  quantity('temperature', what, range(-100, 250, 'the temperature of a requirement', 'degC'));

/** What a quantity demands of the other keys, for editors: JSON Schema conditions from the table of quantities. */
const conditions = QUANTITY_NAMES.map((name) => {
  const rule = REQUIREMENT_QUANTITIES[name];
  const pattern = rule.limit && quantityPattern(rule.limit.dimension);
  const written =
    rule.limit?.dimension === 'ratio'
      ? { anyOf: [{ type: 'number' }, { type: 'string', pattern }] }
      : { type: 'string', pattern };
  const demanded = [
    ...(rule.cut ? ['cut'] : []),
    ...(rule.limit ? ['limit'] : []),
    ...(name === 'pattern_mask' ? ['mask'] : []),
    ...(name === 'declared' ? ['property'] : []),
  ];
  return {
    if: { properties: { quantity: { const: name } }, required: ['quantity'] },
    // biome-ignore lint/suspicious/noThenProperty: a JSON Schema keyword
    then: {
      required: demanded,
      ...(rule.limit ? { properties: { limit: { properties: { at_least: written, at_most: written } } } } : {}),
    },
  };
});

const requirement = z
  .strictObject({
    id: id('Name of the requirement in addresses.'),
    text: text('The requirement in words.'),
    quantity: z
      .enum(QUANTITY_NAMES as [(typeof QUANTITY_NAMES)[number], ...typeof QUANTITY_NAMES])
      .describe('What is compared with the limit.'),
    cut: z.enum(['azimuth', 'elevation']).describe('Principal cut, for quantities of the pattern.').optional(),
    between: z
      .array(id('A group of columns.'))
      .length(2)
      .describe('For isolation: two groups of columns by their ids. Any two different groups when left out.')
      .optional(),
    limit: z
      .strictObject({ at_least: side('Lower limit.'), at_most: side('Upper limit.') })
      .meta({ description: 'Exactly one of at_least and at_most.', ...exactlyOne('at_least', 'at_most') })
      .optional(),
    mask: z
      .array(
        z
          .strictObject({
            from: angle('Begin of the piece.'),
            to: angle('End of the piece, above its begin.'),
            level: quantity(
              'level',
              'Level relative to the maximum of the beam, not to be exceeded.',
              range(-100, 10, 'a level of a mask', 'dB'),
            ),
          })
          .describe('One piece.'),
      )
      .min(1)
      .max(100)
      .describe('Pieces of an angular mask, for pattern_mask.')
      .optional(),
    property: id('For declared: id of the declared property.').optional(),
    allowed: z.array(text('Words.')).min(1).max(50).describe('For declared: the words allowed.').optional(),
    condition: z
      .strictObject({
        band: z
          .strictObject({ low: frequency('Lower edge.'), high: frequency('Upper edge.') })
          .describe("Part of the band. The board's own when left out.")
          .optional(),
        temperature: z
          .strictObject({ low: temperature('Coldest.'), high: temperature('Hottest.') })
          .describe("Part of the temperature range. The board's own when left out.")
          .optional(),
      })
      .describe('Condition over which the worst value is compared.')
      .optional(),
    weight: z.enum(['binding', 'target']).describe('binding: must be met. target: wanted.'),
    source: text('Document and clause that demands it.'),
    verification: z.enum(['calculation', 'test']).describe('test: open until measured, whatever the calculation says.'),
    test_method: text('How it is tested.').optional(),
  })
  .meta({ description: 'One requirement.', allOf: conditions });

export const requirementsDocument = z
  .strictObject({
    id: id('Name of the requirement set.'),
    title: text('Title of the requirement set.'),
    invented: invented(),
    requirements: z.array(requirement).min(1).max(200).describe('The requirements.'),
  })
  .describe('A requirement set.');

export type RequirementDocument = z.infer<typeof requirement>;
export type RequirementsDocument = z.infer<typeof requirementsDocument>;
