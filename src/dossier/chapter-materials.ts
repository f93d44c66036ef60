import type { DeclaredProperty, Figure, Provenance, Texture } from '../manifest/model.js';
import { formatNumber, formatQuantity } from '../quantity/index.js';
import { declarationsByPart } from '../verdict/index.js';
import { cell, chapter, facts, number, prose, table } from './blocks.js';
import type { BoardContext } from './context.js';
import type { Block, Chapter, Inline } from './document.js';
import { figuresOf, figureText, micrometres } from './figures.js';
import { count, GAP, gigahertz, statedNumber, valueText } from './values.js';

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

const nanometres = (metres: number): string => formatQuantity(metres, 'length', { unit: 'nm', decimals: 0 });

/** What is known of a texture beside its height, or that it is not. */
function lateralText({ correlationLength, developedAreaRatio, lay, nodule }: Texture): readonly string[] {
  const known = [
    ...(correlationLength === undefined ? [] : [`correlation length ${micrometres(correlationLength.value)}`]),
    ...(developedAreaRatio === undefined ? [] : [`Sdr ${formatNumber(100 * developedAreaRatio.value, 1)}${GAP}%`]),
    ...(nodule === undefined
      ? []
      : [
          `nodules of radius ${micrometres(nodule.radius.value)} at a pitch of ${micrometres(nodule.pitch.value)}, ${count(nodule.layers, 'layer')}`,
        ]),
    ...(lay === undefined ? [] : [lay === 'isotropic' ? 'isotropic' : `grooves ${lay} the current`]),
  ];
  return known.length === 0 ? ['nothing known beside the height'] : known;
}

const nesting = (name: string, index: number | undefined): string =>
  index === undefined ? `no ${name}-filter` : `${name}-filter nesting index ${micrometres(index)}`;

function measuredText(measured: NonNullable<Texture['measured']>): readonly Inline[] {
  const { file, sha256, kind, shortNestingIndex, longNestingIndex, interval, extent, remarks } = measured;
  return [
    `evaluated from a measured ${kind === 'map' ? 'height map' : 'profile'}, `,
    { code: file },
    ' (SHA-256 ',
    { code: sha256 },
    `): sampled every ${nanometres(interval)} over ${micrometres(extent)}; ${nesting('S', shortNestingIndex)}, ${nesting('L', longNestingIndex)}`,
    ...remarks.map((remark) => `; ${remark}`),
    '; ',
  ];
}

const textureNotes = (face: string, texture: Texture): readonly [string, ...Inline[]] => {
  const { stated, conversion, lengthConversion, instrument, filter, measured } = texture;
  const conditions = [
    instrument === undefined ? 'instrument not stated' : `instrument: ${instrument}`,
    ...(measured === undefined ? [filter === undefined ? 'filter not stated' : `filter: ${filter}`] : []),
  ];
  const height = [`stated as ${stated.parameter} ${micrometres(stated.value)}`, conversion ?? 'used as stated'];
  const parts = [
    ...(measured === undefined ? height : [conversion ?? []].flat()),
    ...lateralText(texture),
    ...[lengthConversion ?? []].flat(),
    ...conditions,
  ];
  return [face, ...(measured === undefined ? [] : measuredText(measured)), parts.join('; ')];
};

/** What the laminate's figures leave open, each with what is done about it. */
function laminateNotes({ board }: BoardContext): Block {
  const { inPlanePermittivity, permittivity, lossTangent, water } = board.stackUp.laminate.material;
  const taken = (figure: Figure) =>
    figure.provenance.frequency === undefined
      ? 'frequency not stated, used as it stands'
      : `taken at ${gigahertz(figure.provenance.frequency)}, carried to the band by causal dispersion`;
  return facts(
    'laminate-notes',
    ['Permittivity over frequency', taken(permittivity)],
    ['Loss tangent over frequency', taken(lossTangent)],
    [
      'In-plane permittivity',
      inPlanePermittivity === undefined
        ? 'not stated, taken as equal to the one through the thickness'
        : `${statedNumber(inPlanePermittivity.value)}; the models take one value, so the difference to the one through the thickness is printed as an uncertainty`,
    ],
    [
      'Water',
      water === undefined
        ? 'uptake not stated, the laminate is taken as dry'
        : `up to ${formatNumber(100 * water.uptake.value, 3)}${GAP}% of its mass in service, printed as an uncertainty`,
    ],
  );
}

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
      'The band of the copper’s texture bounds neither error.',
    ),
    laminateNotes(context),
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
