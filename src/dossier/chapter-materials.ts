import type { DeclaredProperty, Provenance, Texture } from '../manifest/model.js';
import { declarationsByPart } from '../verdict/index.js';
import { cell, chapter, facts, number, prose, table } from './blocks.js';
import type { BoardContext } from './context.js';
import type { Block, Chapter, Inline } from './document.js';
import { figuresOf, figureText, micrometres } from './figures.js';
import { gigahertz, statedNumber, valueText } from './values.js';

type Sourced = Pick<Provenance, 'document' | 'revision' | 'date'>;

export function documentText({ document, revision, date }: Sourced): string {
  if (document === undefined) return 'no document';
  const parts = [document, revision === undefined ? '' : `rev. ${revision}`, date ?? ''];
  return parts.filter((part) => part !== '').join(', ');
}

function permittivityFacts({ board }: BoardContext): Block {
  const { material } = board.stackUp.laminate;
  const fitted = material.fittedOn;
  const kind: readonly Inline[] =
    material.permittivityKind === 'bulk'
      ? ['bulk value: of the dielectric alone, without any effect of copper']
      : [
          `design value${fitted === undefined ? '' : `, fitted on foil ${fitted.foil} and ${micrometres(fitted.thickness)} of laminate`}: part of the slowing of waves by rough copper is already in it`,
        ];
  return facts('permittivity-kind', ['Permittivity stated as', ...kind]);
}

const textureNotes = (face: string, texture: Texture): readonly [string, ...Inline[]] => {
  const { stated, conversion, instrument, filter } = texture;
  const parts = [
    `stated as ${stated.parameter} ${micrometres(stated.value)}`,
    conversion ?? 'used as stated',
    instrument === undefined ? 'instrument not stated' : `instrument: ${instrument}`,
    filter === undefined ? 'filter not stated' : `filter: ${filter}`,
  ];
  return [face, parts.join('; ')];
};

const declaredRow = (part: string, { id, value, unit = '', ...source }: DeclaredProperty) => [
  cell(id),
  cell(part),
  cell(typeof value === 'number' ? statedNumber(value) + (unit === '' ? '' : ` ${unit}`) : valueText(value, unit)),
  cell(documentText(source)),
];

export function materialsChapter(context: BoardContext): Chapter {
  const { board } = context;
  const { strip, ground } = board.stackUp;
  const declared = declarationsByPart(board);
  return chapter(
    'materials',
    'Materials and their basis',
    table(
      'figures',
      'Every material and fabrication figure with where it comes from',
      [
        'Figure|1.5',
        '#Value|1.1',
        'Basis|0.8',
        'Method|1.1',
        '#Frequency|0.8',
        'Direction|0.9',
        'Document|1.3',
        'Written in|1.6',
      ],
      figuresOf(board).map((use) => {
        const { basis, method, frequency, direction, ...source } = use.figure.provenance;
        return [
          cell(use.label),
          number(figureText(use)),
          cell(basis),
          cell(method ?? '–'),
          frequency === undefined ? cell('–') : number(gigahertz(frequency)),
          cell(direction ?? '–'),
          cell(documentText(source)),
          cell({ code: use.figure.path }),
        ];
      }),
    ),
    permittivityFacts(context),
    prose(
      'A bulk (process) value is what a clamped specimen shows without copper. A design value is fitted on lines with a certain foil and thickness; it holds part of the effect of that foil’s roughness, so adding a roughness model counts that part twice, and on another foil or thickness it does not hold. ',
      'The spread over the roughness models bounds neither error.',
    ),
    facts(
      'textures',
      textureNotes('Strip, dielectric face', strip.dielectricFace.texture),
      textureNotes('Strip, outer face', strip.outerFace.texture),
      textureNotes('Ground, dielectric face', ground.dielectricFace.texture),
    ),
    ...(declared.length === 0
      ? []
      : [
          table(
            'declared',
            'Declared properties, compared as they are stated',
            ['Property', 'Declared for', 'Value', 'Document'],
            declared.map(({ part, property }) => declaredRow(part, property)),
          ),
        ]),
  );
}
