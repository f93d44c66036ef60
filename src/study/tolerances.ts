/** What can be moved on a board, and the declared spreads that the study moves. */
import type { Board, Figure } from '../manifest/model.js';
import type { Dimension } from '../quantity/index.js';
import { nominalValues } from './nominal-values.js';
import { type Place, places } from './places.js';
import type { BoardValues } from './values.js';

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
  const moving = movables(board).filter(({ figure }) => figure.minus !== 0 || figure.plus !== 0);
  const declared = moving.map(({ label, figure, dimension, move }) => ({
    label,
    figure,
    dimension,
    low: move(figure.value - figure.minus),
    high: move(figure.value + figure.plus),
  }));
  const taken = new Map<string, number>();
  return [...declared, ...water(board), ...inPlane(board)].map((tolerance) => {
    const slug = tolerance.label.replace(/[^a-z0-9]+/gi, '-').toLowerCase();
    const count = (taken.get(slug) ?? 0) + 1;
    taken.set(slug, count);
    return { id: count === 1 ? slug : `${slug}-${count}`, ...tolerance };
  });
}

/** From dry, as the figures are stated, to all that is taken up in service. */
function water(board: Board): Omit<Tolerance, 'id'>[] {
  const { water: known } = board.stackUp.laminate.material;
  if (!known || (known.permittivityPerShare === undefined && known.lossTangentPerShare === undefined)) return [];
  const low = nominalValues(board);
  const most = known.uptake.value + known.uptake.plus;
  const high = { ...low, waterShare: most };
  const figure: Figure = { ...known.uptake, value: 0, minus: 0, plus: most };
  return [{ label: 'water uptake of the laminate', figure, dimension: 'number', low, high }];
}

/**
 * Not a spread of the part but of the model, which takes the laminate as equal in all directions: at one end it stays so, at
 * the other the permittivity is replaced by the one that does to a line what the stated two do together.
 */
function inPlane(board: Board): Omit<Tolerance, 'id'>[] {
  const { inPlanePermittivity: figure } = board.stackUp.laminate.material;
  if (!figure) return [];
  const low = nominalValues(board);
  const ends = [figure.value - figure.minus, figure.value + figure.plus];
  const away = (value: number): number => Math.abs(Math.log(value / low.permittivity));
  const high = { ...low, inPlanePermittivity: away(ends[0]) > away(ends[1]) ? ends[0] : ends[1] };
  return [{ label: 'in-plane permittivity of the laminate', figure, dimension: 'number', low, high }];
}
