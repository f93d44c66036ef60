/**
 * The numbers of a board that physics needs, apart from their provenance, and the tolerances that move them.
 */
import type { Board, Figure } from '../manifest/model.js';
import type { Dimension } from '../quantity/index.js';

/** SI; textures are Rq. One flat record, so that a tolerance is one changed entry. */
export interface BoardValues {
  readonly permittivity: number;
  readonly lossTangent: number;
  readonly permittivityTemperatureCoefficient: number;
  readonly lossTangentTemperatureCoefficient: number;
  readonly height: number;
  readonly stripThickness: number;
  /** Total growth of every copper outline, m. */
  readonly etch: number;
  readonly stripConductivity: number;
  readonly groundConductivity: number;
  readonly undersideRq: number;
  readonly outerRq: number;
  readonly groundRq: number;
  readonly finishConductivity: readonly number[];
  readonly finishThickness: readonly number[];
  /** Given loss of each feed path, dB; 0 where it is computed from a line. */
  readonly feedLossDb: readonly number[];
}

interface Place {
  readonly figure: Figure;
  readonly label: string;
  readonly dimension: Dimension | 'number';
  readonly set: (values: BoardValues, value: number) => BoardValues;
}

/** Every figure of the board that has a place in `BoardValues`. */
function places(board: Board): Place[] {
  const { strip, ground, laminate } = board.stackUp;
  const at =
    <K extends keyof BoardValues>(key: K) =>
    (values: BoardValues, value: number) => ({
      ...values,
      [key]: value,
    });
  const item =
    (key: 'finishConductivity' | 'finishThickness' | 'feedLossDb', index: number) =>
    (values: BoardValues, value: number) => ({
      ...values,
      [key]: values[key].map((v, i) => (i === index ? value : v)),
    });
  const list: Place[] = [
    {
      figure: laminate.material.permittivity,
      label: 'laminate permittivity',
      dimension: 'number',
      set: at('permittivity'),
    },
    {
      figure: laminate.material.lossTangent,
      label: 'laminate loss tangent',
      dimension: 'number',
      set: at('lossTangent'),
    },
    { figure: laminate.thickness, label: 'laminate thickness', dimension: 'length', set: at('height') },
    { figure: strip.thickness, label: 'strip thickness', dimension: 'length', set: at('stripThickness') },
    {
      figure: strip.foil.conductivity,
      label: 'copper conductivity',
      dimension: 'conductivity',
      set: at('stripConductivity'),
    },
    {
      figure: ground.foil.conductivity,
      label: 'copper conductivity',
      dimension: 'conductivity',
      set: at('groundConductivity'),
    },
    {
      figure: strip.dielectricFace.texture.rq,
      label: 'texture of the face to the laminate',
      dimension: 'length',
      set: at('undersideRq'),
    },
    {
      figure: ground.dielectricFace.texture.rq,
      label: 'texture of the face to the laminate',
      dimension: 'length',
      set: at('groundRq'),
    },
    { figure: strip.outerFace.texture.rq, label: 'texture of the outer face', dimension: 'length', set: at('outerRq') },
  ];
  const { permittivityTemperatureCoefficient: tce, lossTangentTemperatureCoefficient: tcd } = laminate.material;
  if (tce)
    list.push({
      figure: tce,
      label: 'temperature coefficient of permittivity',
      dimension: 'temperature_coefficient',
      set: at('permittivityTemperatureCoefficient'),
    });
  if (tcd)
    list.push({
      figure: tcd,
      label: 'temperature coefficient of loss tangent',
      dimension: 'temperature_coefficient',
      set: at('lossTangentTemperatureCoefficient'),
    });
  strip.finish.layers.forEach((layer, i) => {
    list.push(
      {
        figure: layer.conductivity,
        label: `${layer.material} conductivity`,
        dimension: 'conductivity',
        set: item('finishConductivity', i),
      },
      {
        figure: layer.thickness,
        label: `${layer.material} thickness`,
        dimension: 'length',
        set: item('finishThickness', i),
      },
    );
  });
  board.feed.forEach((path, i) => {
    if (path.lossDb)
      list.push({ figure: path.lossDb, label: 'feed path loss', dimension: 'level', set: item('feedLossDb', i) });
  });
  if (board.tolerances.etch)
    list.push({ figure: board.tolerances.etch, label: 'etched outline', dimension: 'length', set: at('etch') });
  return list;
}

export function nominalValues(board: Board): BoardValues {
  const { strip } = board.stackUp;
  const empty: BoardValues = {
    permittivity: Number.NaN,
    lossTangent: Number.NaN,
    permittivityTemperatureCoefficient: 0,
    lossTangentTemperatureCoefficient: 0,
    height: Number.NaN,
    stripThickness: Number.NaN,
    etch: 0,
    stripConductivity: Number.NaN,
    groundConductivity: Number.NaN,
    undersideRq: Number.NaN,
    outerRq: Number.NaN,
    groundRq: Number.NaN,
    finishConductivity: strip.finish.layers.map(() => Number.NaN),
    finishThickness: strip.finish.layers.map(() => Number.NaN),
    feedLossDb: board.feed.map(() => 0),
  };
  return places(board).reduce((values, place) => place.set(values, place.figure.value), empty);
}

/** One figure of a board that can be moved alone: the same figure of a library moves everywhere it is used. */
export interface Movable {
  readonly label: string;
  readonly figure: Figure;
  readonly dimension: Dimension | 'number';
  /** The nominal values with this figure at another value. */
  readonly move: (value: number) => BoardValues;
}

export function movables(board: Board): Movable[] {
  const nominal = nominalValues(board);
  const byPath = new Map<string, Place[]>();
  for (const place of places(board)) {
    byPath.set(place.figure.path, [...(byPath.get(place.figure.path) ?? []), place]);
  }
  return [...byPath.values()].map((group) => {
    const { figure, label, dimension } = group[0];
    const move = (value: number): BoardValues => group.reduce((values, place) => place.set(values, value), nominal);
    return { label, figure, dimension, move };
  });
}

/** One declared spread. */
export interface Tolerance {
  readonly id: string;
  readonly label: string;
  readonly figure: Figure;
  readonly dimension: Dimension | 'number';
  readonly low: BoardValues;
  readonly high: BoardValues;
}

export function tolerances(board: Board): Tolerance[] {
  const taken = new Map<string, number>();
  const moving = movables(board).filter(({ figure }) => figure.minus !== 0 || figure.plus !== 0);
  return moving.map(({ label, figure, dimension, move }) => {
    const slug = label.replace(/[^a-z0-9]+/gi, '-').toLowerCase();
    const count = (taken.get(slug) ?? 0) + 1;
    taken.set(slug, count);
    return {
      id: count === 1 ? slug : `${slug}-${count}`,
      label,
      figure,
      dimension,
      low: move(figure.value - figure.minus),
      high: move(figure.value + figure.plus),
    };
  });
}
