import type { Board, Figure, FinishLayer, Texture } from '../manifest/model.js';
import { type Dimension, formatSpread } from '../quantity/index.js';
import { declarationsByPart } from '../verdict/index.js';
import { micrometres } from './figures.js';
import { LAYOUT_FIELDS } from './layout-differences.js';
import { factorText } from './retuning.js';
import { bandText, celsius, costText, count, gigahertz, statedNumber, temperatureText } from './values.js';

interface Field {
  readonly label: string;
  readonly text: (board: Board) => string;
}

const mm = (metres: number): string => statedNumber(metres * 1e3, 6);
const list = (values: readonly string[]): string => {
  const distinct = [...new Set(values)];
  return distinct.length === 1 && values.length > 1 ? `${distinct[0]} (all ${values.length})` : values.join(', ');
};
const perColumn = (board: Board, text: (column: Board['columns'][number]) => string): string => {
  const texts = board.columns.map(text);
  const distinct = [...new Set(texts)];
  return distinct.length === 1 ? distinct[0] : texts.map((t, i) => `column ${i + 1}: ${t}`).join('; ');
};
const optional = (figure: Figure | undefined, dimension: Dimension | 'number'): string =>
  figure === undefined ? 'none' : formatSpread(figure.value, figure.minus, figure.plus, dimension);
const layers = (finish: readonly FinishLayer[], text: (layer: FinishLayer) => string): string =>
  finish.length === 0 ? 'bare' : finish.map((layer) => `${layer.material}: ${text(layer)}`).join('; ');
const spread = (figure: Figure, dimension: Dimension | 'number'): string => optional(figure, dimension);

/** All that is known of a texture: boards may differ in nothing but what Rq cannot see. */
function textureText({ rq, rz, correlationLength, developedAreaRatio, lay, nodule, measured }: Texture): string {
  return [
    `Rq ${spread(rq, 'length')}`,
    ...(rz === undefined ? [] : [`Rz ${spread(rz, 'length')}`]),
    correlationLength === undefined
      ? 'no correlation length'
      : `correlation length ${spread(correlationLength, 'length')}`,
    developedAreaRatio === undefined ? 'no Sdr' : `Sdr ${spread(developedAreaRatio, 'ratio')}`,
    ...(lay === undefined ? [] : [`lay ${lay}`]),
    ...(nodule === undefined
      ? []
      : [
          `nodules of radius ${spread(nodule.radius, 'length')}, pitch ${spread(nodule.pitch, 'length')}, ${count(nodule.layers, 'layer')}`,
        ]),
    ...(measured === undefined ? [] : [`measured: ${measured.file}`]),
  ].join('; ');
}

/** Dispersion counts from there. */
const takenAt = ({ provenance: { frequency } }: Figure): string =>
  frequency === undefined ? 'not stated' : gigahertz(frequency);

function waterText(board: Board): string {
  const { water } = board.stackUp.laminate.material;
  if (water === undefined) return 'not stated';
  const { uptake, permittivityPerShare, lossTangentPerShare } = water;
  return [
    `share of mass ${spread(uptake, 'ratio')}`,
    ...(permittivityPerShare === undefined ? [] : [`permittivity ${statedNumber(permittivityPerShare)} per share`]),
    ...(lossTangentPerShare === undefined ? [] : [`loss tangent ${statedNumber(lossTangentPerShare)} per share`]),
  ].join('; ');
}

/** As stated, wherever they are declared for the board; the same property of two parts once each. */
function declaredText(board: Board): string {
  const texts = declarationsByPart(board).map(
    ({ property: { id, value, unit } }) => `${id} ${value}${unit === undefined ? '' : ` ${unit}`}`,
  );
  return texts.length === 0 ? 'none' : [...new Set(texts)].join('; ');
}

/** What a board is, field by field, in the order of the board file. Every field that changes a result is here. */
const FIELDS: readonly Field[] = [
  { label: 'Laminate', text: (b) => `${b.stackUp.laminate.material.name}, ${b.stackUp.laminate.material.maker}` },
  {
    label: 'Permittivity',
    text: (b) =>
      `${spread(b.stackUp.laminate.material.permittivity, 'number')} (${b.stackUp.laminate.material.permittivityKind})`,
  },
  { label: 'Permittivity taken at', text: (b) => takenAt(b.stackUp.laminate.material.permittivity) },
  { label: 'In-plane permittivity', text: (b) => optional(b.stackUp.laminate.material.inPlanePermittivity, 'number') },
  { label: 'Loss tangent taken at', text: (b) => takenAt(b.stackUp.laminate.material.lossTangent) },
  { label: 'Water taken up', text: waterText },
  { label: 'Loss tangent', text: (b) => spread(b.stackUp.laminate.material.lossTangent, 'number') },
  {
    label: 'Temperature coefficient of permittivity',
    text: (b) => optional(b.stackUp.laminate.material.permittivityTemperatureCoefficient, 'temperature_coefficient'),
  },
  {
    label: 'Temperature coefficient of loss tangent',
    text: (b) => optional(b.stackUp.laminate.material.lossTangentTemperatureCoefficient, 'temperature_coefficient'),
  },
  { label: 'Laminate thickness', text: (b) => spread(b.stackUp.laminate.thickness, 'length') },
  { label: 'Strip foil', text: (b) => `${b.stackUp.strip.foil.name}, ${b.stackUp.strip.foil.maker}` },
  { label: 'Strip thickness', text: (b) => spread(b.stackUp.strip.thickness, 'length') },
  { label: 'Strip conductivity', text: (b) => spread(b.stackUp.strip.foil.conductivity, 'conductivity') },
  {
    label: 'Temperature coefficient of the strip copper',
    text: (b) => `${statedNumber(b.stackUp.strip.foil.temperatureCoefficient)} 1/K`,
  },
  {
    label: 'Strip, dielectric face',
    text: (b) => `${b.stackUp.strip.dielectricFace.kind}, ${textureText(b.stackUp.strip.dielectricFace.texture)}`,
  },
  {
    label: 'Strip, outer face',
    text: (b) => `${b.stackUp.strip.outerFace.kind}, ${textureText(b.stackUp.strip.outerFace.texture)}`,
  },
  { label: 'Finish', text: (b) => b.stackUp.strip.finish.name },
  {
    label: 'Finish layers',
    text: (b) =>
      layers(
        b.stackUp.strip.finish.layers,
        (l) =>
          `${spread(l.thickness, 'length')}, ${spread(l.conductivity, 'conductivity')}, relative permeability ${statedNumber(l.relativePermeability)}`,
      ),
  },
  {
    label: 'Cover layer',
    text: ({ stackUp: { cover } }) =>
      cover === undefined
        ? 'none'
        : `${cover.material}, ${spread(cover.thickness, 'length')}, permittivity ${spread(cover.permittivity, 'number')}, loss tangent ${spread(cover.lossTangent, 'number')}`,
  },
  { label: 'Ground foil', text: (b) => `${b.stackUp.ground.foil.name}, ${b.stackUp.ground.foil.maker}` },
  { label: 'Ground thickness', text: (b) => spread(b.stackUp.ground.thickness, 'length') },
  { label: 'Ground conductivity', text: (b) => spread(b.stackUp.ground.foil.conductivity, 'conductivity') },
  {
    label: 'Temperature coefficient of the ground copper',
    text: (b) => `${statedNumber(b.stackUp.ground.foil.temperatureCoefficient)} 1/K`,
  },
  {
    label: 'Ground, dielectric face',
    text: (b) => `${b.stackUp.ground.dielectricFace.kind}, ${textureText(b.stackUp.ground.dielectricFace.texture)}`,
  },
  {
    label: 'Layers below the ground',
    text: (b) =>
      b.stackUp.below.length === 0
        ? 'none'
        : b.stackUp.below.map((layer) => `${layer.name} ${micrometres(layer.thickness)}`).join(', '),
  },
  { label: 'Columns', text: (b) => String(b.columns.length) },
  { label: 'Pitch (mm)', text: (b) => mm(b.pitch) },
  { label: 'Column positions, y (mm)', text: (b) => b.columns.map((c) => mm(c.y)).join(', ') },
  { label: 'Start of the columns, x (mm)', text: (b) => list(b.columns.map((c) => mm(c.x))) },
  {
    label: 'Feed line, width × length (mm)',
    text: (b) => perColumn(b, (c) => `${mm(c.feedLine.width)} × ${mm(c.feedLine.length)}`),
  },
  { label: 'Patch widths (mm)', text: (b) => perColumn(b, (c) => list(c.patches.map((p) => mm(p.width)))) },
  { label: 'Patch lengths (mm)', text: (b) => perColumn(b, (c) => list(c.patches.map((p) => mm(p.length)))) },
  { label: 'Link widths (mm)', text: (b) => perColumn(b, (c) => list(c.links.map((l) => mm(l.width)))) },
  { label: 'Link lengths (mm)', text: (b) => perColumn(b, (c) => list(c.links.map((l) => mm(l.length)))) },
  ...LAYOUT_FIELDS,
  {
    label: 'Retuned by',
    text: ({ retuned }) =>
      retuned === undefined
        ? 'as drawn'
        : 'reason' in retuned
          ? 'not possible'
          : `length × ${factorText(retuned.factor)}`,
  },
  { label: 'Feed amplitudes', text: (b) => list(b.feed.map((p) => statedNumber(p.amplitude, 6))) },
  { label: 'Feed phases', text: (b) => list(b.feed.map((p) => `${statedNumber((p.phase * 180) / Math.PI, 4)}°`)) },
  {
    label: 'Feed losses',
    text: (b) =>
      list(
        b.feed.map((p) =>
          p.line === undefined ? optional(p.lossDb, 'level') : `line ${mm(p.line.width)} × ${mm(p.line.length)} mm`,
        ),
      ),
  },
  {
    label: 'Reference impedance',
    text: (b) => (b.referenceImpedance === 'line' ? 'the feed line' : `${statedNumber(b.referenceImpedance)} Ω`),
  },
  { label: 'Operating band', text: (b) => bandText(b.band) },
  {
    label: 'Temperature range',
    text: (b) => `${temperatureText(b.temperature)}, nominal ${celsius(b.temperature.nominalC)}`,
  },
  { label: 'Etching tolerance', text: (b) => optional(b.tolerances.etch, 'length') },
  { label: 'Declared properties', text: declaredText },
  {
    label: 'Cost',
    text: (b) => (b.cost === undefined ? 'not given' : costText(b.cost)),
  },
];

export interface Difference {
  readonly label: string;
  /** One text per board. */
  readonly values: readonly string[];
}

/** Fields in which at least two of the boards differ. */
export function differencesBetween(boards: readonly Board[]): readonly Difference[] {
  return FIELDS.map(({ label, text }) => ({ label, values: boards.map(text) })).filter(
    ({ values }) => new Set(values).size > 1,
  );
}
