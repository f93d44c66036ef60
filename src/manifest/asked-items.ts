import type { Board, Figure, Requirement } from './model.js';
import type { AskedItem, AskedWords, HeldParameter, Procurement, Recipient } from './procurement-model.js';

type Need = Omit<AskedItem, 'id' | 'group' | 'figures' | 'nominal' | 'lower' | 'upper'> & {
  readonly board: string;
  readonly figure: Pick<Figure, 'value' | 'minus' | 'plus' | 'path'>;
};

const LENGTH = { dimension: 'length', unit: 'um' } as const;
const NUMBER = { dimension: 'number' } as const;

/**
 * What a recipient has to hold, read from the figures of its boards: one item for each nominal value, with limits that
 * suit all boards. Fields other than the figures named here never reach a sheet.
 */
export function askedItems(recipient: Recipient, boards: readonly Board[], procurement: Procurement): AskedItem[] {
  const concerned = boards.filter((board) => recipient.boards.includes(board.id));
  const groups = recipient.materials.length === 0 ? [undefined] : recipient.materials;
  return groups.flatMap((material, i) => {
    const group = String.fromCharCode(65 + i);
    const needs = concerned.flatMap((board) => needsOf(recipient, material, board));
    return [...merged(needs, group), ...(material === undefined ? slopeItem(group, procurement) : [])];
  });
}

function needsOf(recipient: Recipient, material: string | undefined, board: Board): readonly Need[] {
  if (recipient.kind === 'laminate maker') return laminateNeeds(board, material!);
  return recipient.kind === 'foil maker' ? foilNeeds(board, material!) : fabricationNeeds(board);
}

function laminateNeeds(board: Board, id: string): readonly Need[] {
  const { material, thickness } = board.stackUp.laminate;
  if (material.id !== id) return [];
  const at = { board: board.id, material: id };
  return [
    { ...at, ...LENGTH, parameter: 'laminate-thickness', upperOnly: false, figure: thickness },
    { ...at, ...NUMBER, parameter: 'permittivity', upperOnly: false, figure: material.permittivity },
    { ...at, ...NUMBER, parameter: 'loss-tangent', upperOnly: true, figure: material.lossTangent },
  ];
}

function foilNeeds(board: Board, id: string): readonly Need[] {
  const { strip, ground } = board.stackUp;
  const face = (kind: 'treated' | 'untreated', figure: Figure): Need => ({
    board: board.id,
    material: id,
    ...LENGTH,
    parameter: kind === 'treated' ? 'treated-face-texture' : 'untreated-face-texture',
    upperOnly: true,
    figure,
  });
  const other = strip.dielectricFace.kind === 'treated' ? 'untreated' : 'treated';
  return [
    ...(strip.foil.id === id ? [face(strip.dielectricFace.kind, strip.dielectricFace.texture.rq)] : []),
    ...(ground.foil.id === id ? [face(ground.dielectricFace.kind, ground.dielectricFace.texture.rq)] : []),
    // A plated or micro-etched outer face is the fabricator's.
    ...(strip.foil.id === id && strip.outerFace.kind === 'foil' ? [face(other, strip.outerFace.texture.rq)] : []),
  ];
}

function fabricationNeeds(board: Board): readonly Need[] {
  const { strip, ground } = board.stackUp;
  const at = { board: board.id, ...LENGTH, upperOnly: false };
  const { etch } = board.tolerances;
  return [
    { ...at, parameter: 'copper-thickness', figure: strip.thickness },
    { ...at, parameter: 'copper-thickness', figure: ground.thickness },
    ...(etch ? [{ ...at, parameter: 'etched-width', figure: etch } as const] : []),
    ...(strip.outerFace.kind === 'foil'
      ? []
      : [{ ...at, upperOnly: true, parameter: 'outer-face-texture', figure: strip.outerFace.texture.rq } as const]),
    ...strip.finish.layers.map(
      (layer): Need => ({
        ...at,
        parameter: 'finish-thickness',
        material: strip.finish.id,
        layer: layer.material,
        figure: layer.thickness,
      }),
    ),
  ];
}

/** One item a nominal value, in order of first need; its limits are the intersection of those of all boards. */
function merged(needs: readonly Need[], group: string): AskedItem[] {
  const byKey = new Map<string, Need[]>();
  for (const need of needs) {
    const key = JSON.stringify([need.parameter, need.material, need.layer, Number(need.figure.value.toPrecision(9))]);
    byKey.set(key, [...(byKey.get(key) ?? []), need]);
  }
  const taken = new Map<HeldParameter, number>();
  return [...byKey.values()].map((same) => {
    const { board: _board, figure, ...first } = same[0]!;
    const count = (taken.get(first.parameter) ?? 0) + 1;
    taken.set(first.parameter, count);
    const places = same.map((need) => ({ board: need.board, path: need.figure.path }));
    return {
      ...first,
      id: `${group}-${first.parameter}${count === 1 ? '' : `-${count}`}`,
      group,
      nominal: figure.value,
      lower: Math.max(...same.map((need) => need.figure.value - need.figure.minus)),
      upper: Math.min(...same.map((need) => need.figure.value + need.figure.plus)),
      figures: places.filter(
        (place, i) => places.findIndex((p) => p.board === place.board && p.path === place.path) === i,
      ),
    };
  });
}

function slopeItem(group: string, { edgeSlope }: Procurement): AskedItem[] {
  if (!edgeSlope) return [];
  const rest = {
    group,
    parameter: 'edge-slope',
    dimension: 'angle',
    unit: 'deg',
    upperOnly: false,
    figures: [],
  } as const;
  return [{ id: `${group}-edge-slope`, ...rest, ...edgeSlope }];
}

const SUBSTANCES: readonly (readonly [string, string])[] = [
  ['rohs', 'RoHS: Directive 2011/65/EU with its amendments, exemptions used'],
  ['reach', 'REACH: Regulation (EC) No 1907/2006, candidate-list substances above 0.1 % by mass'],
  ['pfas', 'PFAS: contained or not; where contained, which and in which material'],
];

/** What a recipient answers in words. Declared properties are asked of whoever's material declares them. */
export function askedWords(
  recipient: Recipient,
  boards: readonly Board[],
  requirements: readonly Requirement[],
  procurement: Procurement,
): AskedWords[] {
  const concerned = boards.filter((board) => recipient.boards.includes(board.id));
  const known = new Set(concerned.flatMap((board) => propertiesFrom(recipient, board)));
  const properties = new Map<string, AskedWords>();
  for (const property of known) {
    const needed = requirements.filter((r) => r.quantity === 'declared' && r.property === property).map(neededText);
    properties.set(property, {
      id: `D-${property}`,
      kind: 'property',
      what: property.replaceAll('-', ' '),
      ...(needed.length === 0 ? {} : { needed: [...new Set(needed)].join('; ') }),
    });
  }
  // The substance rules are asked in full, whatever a library says of them in one word.
  properties.delete('substances');
  return [
    ...[...properties.values()].sort((a, b) => (a.id < b.id ? -1 : 1)),
    ...SUBSTANCES.map(([id, what]): AskedWords => ({ id: `S-${id}`, kind: 'substance', what })),
    ...procurement.declare.map((what, i): AskedWords => ({ id: `T-${i + 1}`, kind: 'other', what })),
    ...recipient.quantities.map(
      (what, i): AskedWords => ({ id: `Q-${i + 1}`, kind: 'quantity', what: `Price and lead time: ${what}` }),
    ),
  ];
}

function propertiesFrom({ kind, materials }: Recipient, { stackUp, declared }: Board): readonly string[] {
  const { laminate, strip, ground } = stackUp;
  const of = (part: { readonly id: string; readonly declared: Board['declared'] }) =>
    materials.includes(part.id) ? part.declared.map((d) => d.id) : [];
  if (kind === 'laminate maker') return of(laminate.material);
  if (kind === 'foil maker') return [...of(strip.foil), ...of(ground.foil)];
  return [...declared, ...strip.finish.declared].map((d) => d.id);
}

function neededText({ allowed, limit, unit }: Requirement): string {
  if (limit === undefined) return (allowed ?? []).join(' or ');
  const words = limit.direction === 'at_least' ? 'at least' : 'at most';
  return `${words} ${limit.value}${unit === undefined ? '' : ` ${unit}`}`;
}
