import { z } from 'zod';
import { date, figure, id, quantity, range, reference, text } from './fields.js';

const verification = (what: string) =>
  z
    .strictObject({
      method: text('Method reference, for instance an IPC-TM-650 number. It is cited, never reproduced.').optional(),
      specimen: text('Coupon or specimen on which it is verified.').optional(),
    })
    .describe(`How ${what} is verified. What is left out is the default of the sheet.`)
    .optional();

const recipient = z
  .strictObject({
    id: id('Name of the sheet in addresses and file names. The recipient sees it.'),
    kind: z
      .enum(['laminate_maker', 'foil_maker', 'board_fabricator'])
      .describe('Decides which fields may stand on the sheet.'),
    name: text('Name of the recipient as addressed.'),
    boards: z
      .array(id('Id of a board of the pack.'))
      .min(1)
      .max(40)
      .describe('Boards that what is asked is for. They are not named on the sheet.'),
    materials: z
      .array(id('Id of a laminate or foil of the libraries.'))
      .min(1)
      .max(10)
      .describe('Laminates or foils asked of a maker. A fabricator has none.')
      .optional(),
    quantities: z
      .array(text('One quantity with its occasion.'))
      .min(1)
      .max(12)
      .describe('Quantities for this recipient instead of those for all, for instance rolls of foil.')
      .optional(),
    answers: reference('The CSV that came back.').optional(),
  })
  .describe('One recipient of a sheet.');

/** What is asked of suppliers: one sheet a recipient. */
export const procurementDocument = z
  .strictObject({
    rfq_number: text('Number of the request for quotation.'),
    reply_date: date('Last day for the answer.'),
    contact: z
      .strictObject({
        who: text('Role or name of the person who takes the answer.'),
        address: text('Where the answer goes.'),
      })
      .describe('Who takes the answer. A role may stand for a name.'),
    nda: text('Reference of the non-disclosure agreement under which sheets are sent.').optional(),
    quantities: z
      .array(text('One quantity with its occasion, for instance "200 panels, prototypes".'))
      .min(1)
      .max(12)
      .describe('Quantities to quote for.'),
    panel: z
      .strictObject({
        width: quantity('length', 'Width of the panel.', range(0.05, 2, 'a side of a panel', 'mm')),
        length: quantity('length', 'Length of the panel.', range(0.05, 2, 'a side of a panel', 'mm')),
      })
      .describe('Size of the production panel.'),
    certificate: text('What the certificate of conformance states with each delivery.'),
    sampling: z
      .strictObject({
        confidence: z
          .number()
          .min(0.5)
          .max(0.9999)
          .describe('Confidence, for instance 0.95. With it goes reliability.')
          .optional(),
        reliability: z
          .number()
          .min(0.5)
          .max(0.9999)
          .describe(
            'Share that passes, for instance 0.9. The sample is ln(1 - confidence)/ln(reliability), rounded up.',
          )
          .optional(),
        plan: text(
          'Instead of both: a cited plan, for instance "ISO 2859-1, level II, AQL 0.65, code letter by lot".',
        ).optional(),
      })
      .describe('Sample size: confidence and reliability together, or a plan.'),
    allowances: z
      .enum(['printed', 'kept_inside'])
      .describe(
        'Whether sheets print how far a calculated allowance reaches beyond the stated limit. Printed when left out.',
      )
      .optional(),
    texture: z
      .strictObject({
        standard: z
          .enum(['profile', 'areal'])
          .describe(
            'profile: Rq of ISO 21920-2 under conditions of ISO 21920-3. areal: Sq of ISO 25178-2 under those of ISO 25178-3.',
          ),
        instrument: text('Instrument, for instance "white-light interferometer, 50x".'),
        filter: text('Filters and evaluation length or area (nesting indices).'),
      })
      .describe('How textures are measured. Left out: the supplier states it with the answer.')
      .optional(),
    edge_slope: figure(
      'angle',
      'Slope of etched edges: angle between laminate and edge, 90 deg upright. Asked of fabricators; not computed.',
      range(0.5, 2.2, 'an edge slope', 'deg'),
    ).optional(),
    verification: z
      .strictObject({
        laminate_thickness: verification('the thickness of the laminate'),
        permittivity: verification('permittivity'),
        loss_tangent: verification('the loss tangent'),
        foil_texture: verification('the texture of the foil'),
        copper_thickness: verification('the finished thickness of the copper'),
        etched_width: verification('the etched width'),
        edge_slope: verification('the slope of etched edges'),
        finish_thickness: verification('the thickness of finish layers'),
        outer_texture: verification('the texture of plated or micro-etched copper'),
      })
      .describe('Verification of each item where the default does not fit.')
      .optional(),
    declare: z
      .array(text('One thing to declare, for instance "Country of origin".'))
      .max(20)
      .describe('What every recipient declares beside RoHS, REACH and PFAS.')
      .optional(),
    recipients: z.array(recipient).min(1).max(20).describe('One sheet is written for each.'),
  })
  .describe('Procurement: what is asked of the suppliers of a pack.');

export type ProcurementDocument = z.infer<typeof procurementDocument>;
export type RecipientDocument = ProcurementDocument['recipients'][number];

const number = (description: string) => z.number().describe(description).optional();
const words = (description: string) => text(description).optional();

/** A returned sheet as a list of rows: the shape that the rows of a CSV are checked with. */
export const answersDocument = z
  .array(
    z
      .strictObject({
        item: text('Item as on the sheet.'),
        unit: words('Unit as on the sheet.'),
        rfq: words('Number of the request as on the sheet.'),
        nominal: number('As asked.'),
        lower_limit: number('As asked.'),
        upper_limit: number('As asked.'),
        guaranteed_lower: number('Guaranteed from, in the unit of the row.'),
        guaranteed_upper: number('Guaranteed to, in the unit of the row.'),
        typical: number('Typical value, in the unit of the row.'),
        alternative: words('What is offered instead.'),
        not_offered: z.enum(['yes', 'no']).describe('yes where the item is not offered.').optional(),
        method: words('How the answer was obtained or is verified.'),
        declaration: words('Answer in words, for declared properties, substances and quantities.'),
      })
      .describe('One row.'),
  )
  .max(500);

export type AnswersDocument = z.infer<typeof answersDocument>;
