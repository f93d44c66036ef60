import type { Board, Figure, Texture } from '../manifest/model.js';
import { type Dimension, formatQuantity, formatSpread } from '../quantity/index.js';
import { bandText, gigahertz } from './values.js';

/** A material or fabrication figure as a board uses it. */
export interface FigureUse {
  readonly label: string;
  readonly figure: Figure;
  readonly dimension: Dimension | 'number';
  /** Depends on frequency and direction, so that where it was taken matters. */
  readonly dielectric: boolean;
}

/** Every figure a board rests on, each once (the same line of a library used twice is one figure), in order of the stack. */
export function figuresOf(board: Board): readonly FigureUse[] {
  const { cover, strip, laminate, ground } = board.stackUp;
  const uses: FigureUse[] = [];
  const add = (label: string, figure: Figure | undefined, dimension: FigureUse['dimension'], dielectric = false) => {
    if (figure !== undefined && !uses.some((use) => use.figure.path === figure.path)) {
      uses.push({ label, figure, dimension, dielectric });
    }
  };
  const addTexture = (face: string, { rq, correlationLength, developedAreaRatio, rz, nodule }: Texture) => {
    add(`Rq of the ${face}`, rq, 'length');
    add(`Rz of the ${face}`, rz, 'length');
    add(`Correlation length of the ${face}`, correlationLength, 'length');
    add(`Sdr of the ${face}`, developedAreaRatio, 'ratio');
    add(`Radius of the nodules of the ${face}`, nodule?.radius, 'length');
    add(`Pitch of the nodules of the ${face}`, nodule?.pitch, 'length');
  };
  add('Permittivity of the laminate', laminate.material.permittivity, 'number', true);
  add('In-plane permittivity of the laminate', laminate.material.inPlanePermittivity, 'number', true);
  add('Loss tangent of the laminate', laminate.material.lossTangent, 'number', true);
  add(
    'Temperature coefficient of permittivity',
    laminate.material.permittivityTemperatureCoefficient,
    'temperature_coefficient',
  );
  add(
    'Temperature coefficient of loss tangent',
    laminate.material.lossTangentTemperatureCoefficient,
    'temperature_coefficient',
  );
  add('Water taken up by the laminate, share of mass', laminate.material.water?.uptake, 'ratio');
  add('Thickness of the laminate', laminate.thickness, 'length');
  add('Thickness of the strip', strip.thickness, 'length');
  add('Conductivity of the strip copper', strip.foil.conductivity, 'conductivity');
  addTexture('strip, dielectric face', strip.dielectricFace.texture);
  addTexture('strip, outer face', strip.outerFace.texture);
  for (const layer of strip.finish.layers) {
    add(`Thickness of ${layer.material} (finish)`, layer.thickness, 'length');
    add(`Conductivity of ${layer.material} (finish)`, layer.conductivity, 'conductivity');
  }
  add('Thickness of the ground', ground.thickness, 'length');
  add('Conductivity of the ground copper', ground.foil.conductivity, 'conductivity');
  addTexture('ground, dielectric face', ground.dielectricFace.texture);
  add('Thickness of the cover layer', cover?.thickness, 'length');
  add('Permittivity of the cover layer', cover?.permittivity, 'number', true);
  add('Loss tangent of the cover layer', cover?.lossTangent, 'number', true);
  const lossPaths = new Set(board.feed.flatMap((path) => path.lossDb?.path ?? []));
  board.feed.forEach((path, i) => {
    add(lossPaths.size === 1 ? 'Feed loss' : `Feed loss to column ${i + 1}`, path.lossDb, 'level');
  });
  add('Change of copper outlines by etching', board.tolerances.etch, 'length');
  return uses;
}

export const figureText = ({ figure, dimension }: FigureUse): string =>
  formatSpread(figure.value, figure.minus, figure.plus, dimension);

/** Text of a figure that is known by its path only, such as that of a tolerance. */
export function figureTextByPath(board: Board, figure: Figure): string {
  const use = figuresOf(board).find((u) => u.figure.path === figure.path);
  return figureText({ ...(use ?? { label: '', dimension: 'number', dielectric: false }), figure });
}

export interface Concern {
  readonly use: FigureUse;
  readonly outsideFrequency: boolean;
  /** In the order printed, each a short clause. */
  readonly clauses: readonly string[];
  /** Sorts the strongest assumption first. */
  readonly weight: number;
}

/** A figure taken within this share of the band's edges counts as taken in the band. */
const NEAR = 0.02;

function concernOf(use: FigureUse, board: Board): Concern | undefined {
  const { basis, frequency, direction } = use.figure.provenance;
  const clauses: string[] = [];
  let outsideFrequency = false;
  if (use.dielectric) {
    if (frequency === undefined) {
      outsideFrequency = true;
      clauses.push(`frequency not stated, used at ${bandText(board.band)}`);
    } else if (frequency < board.band.low * (1 - NEAR) || frequency > board.band.high * (1 + NEAR)) {
      outsideFrequency = true;
      clauses.push(`taken at ${gigahertz(frequency)}, used at ${bandText(board.band)}`);
    }
    if (direction === 'in-plane' && use.figure !== board.stackUp.laminate.material.inPlanePermittivity)
      clauses.push('taken in plane, used through the thickness');
  }
  if (basis === 'estimated') clauses.push('estimated, without a source that stands for it');
  if (basis === 'typical') clauses.push('typical, not guaranteed');
  if (clauses.length === 0) return undefined;
  const weight = (basis === 'estimated' ? 4 : basis === 'typical' ? 1 : 0) + (outsideFrequency ? 5 : 0);
  return { use, outsideFrequency, clauses, weight };
}

/**
 * Every figure that is typical, estimated or used outside its frequency or direction. First those used outside their
 * frequency, among them the estimated ones; then estimated, then typical.
 */
export function concernsOf(board: Board): readonly Concern[] {
  const concerns = figuresOf(board).flatMap((use) => concernOf(use, board) ?? []);
  return [...concerns].sort((a, b) => b.weight - a.weight);
}

export const micrometres = (metres: number): string => formatQuantity(metres, 'length', { unit: 'um' });
