import { z } from 'zod';
import { exactlyOne, figure, quantity, range, reference, replacing, statement } from './fields.js';
import { lineLength, MOST_COLUMNS, width } from './layout-fields.js';

const path = z
  .strictObject({
    loss: figure(
      'level',
      'Loss from the gain reference plane to the column.',
      range(0, 30, 'the loss of a feed path', 'dB'),
      { floor: 0 },
    ).optional(),
    line: z
      .strictObject({ width: width('a line'), length: lineLength('a feed path') })
      .describe('Microstrip on this stack-up; its loss is computed.')
      .optional(),
  })
  .meta({
    description: 'Path from the gain reference plane to a column: a loss, or a line.',
    ...exactlyOne('loss', 'line'),
  });

const drawnLength = (of: string) =>
  quantity(
    'length',
    `Length of ${of}; its quarter-wave steps are part of it.`,
    range(50e-6, 0.5, `the length of ${of}`, 'mm'),
  );

const network = z
  .strictObject({
    divider: z
      .enum(['tee', 'wilkinson'])
      .describe('Kind of every divider: a junction without resistor, or one whose arms a resistor isolates.'),
    line_width: width('the lines of the feed network'),
    trunk_length: drawnLength('the line from the input to the first divider'),
    level_length: drawnLength('the lines from one level of dividers to the next'),
    transition: z
      .strictObject({
        file: reference('Two-port data as a Touchstone file (.s2p); port 2 faces the antenna.'),
      })
      .describe('Transition between the input of the network and the port of the radar.')
      .optional(),
  })
  .describe(
    'A corporate network from one input to all driven columns, on this stack-up; it sets the amplitudes and phases of the feed at the middle of the band, and its loss, ripple and reflection are computed.',
  );

export const feedDocument = replacing(
  z
    .strictObject({
      amplitude: z
        .array(z.number().min(0).max(1e6).describe('Amplitude at a column, at least 0.'))
        .min(1)
        .max(MOST_COLUMNS)
        .describe('Relative amplitude of the incident wave at each column; not all 0.'),
      phase: z
        .array(quantity('angle', 'Phase at a column.', range(-100, 100, 'a phase', 'deg')))
        .min(1)
        .max(MOST_COLUMNS)
        .describe('Phase of the incident wave at each column. All 0 when left out.')
        .optional(),
      path: statement(
        z
          .union([path, z.array(path).min(1).max(MOST_COLUMNS).describe('One path per column.')])
          .describe(
            'Path from the gain reference plane to the columns: one for all, or a list. Either path or network; in a variant one takes the place of the other.',
          ),
        { what: 'the feed path' },
      ).optional(),
      network: network.optional(),
    })
    .meta({ description: 'How the columns are driven.', ...exactlyOne('path', 'network') }),
  { path: ['network'], network: ['path'] },
);

export type FeedDocument = z.infer<typeof feedDocument>;
