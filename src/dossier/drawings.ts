import type { Board, Texture } from '../manifest/model.js';
import { drawnColumn } from './array-outline.js';
import type { ArrayDrawing, StackUpDrawing } from './document.js';
import { micrometres } from './figures.js';
import { rounded, statedNumber } from './values.js';

const um = (metres: number): number => rounded(metres * 1e6, 3);

const textureText = (texture: Texture): string => `Rq ${micrometres(texture.rq.value)}`;

export function stackUpDrawing(board: Board): StackUpDrawing {
  const { cover, strip, laminate, ground, below } = board.stackUp;
  const coverLayers =
    cover === undefined
      ? []
      : [
          {
            label: `Cover layer: ${cover.material}`,
            detail: `permittivity ${statedNumber(cover.permittivity.value)}, computed for lines, not for columns`,
            thicknessUm: um(cover.thickness.value),
            material: 'cover' as const,
            computed: true,
          },
        ];
  return {
    drawing: 'stack-up',
    layers: [
      ...coverLayers,
      {
        label: `Strip: ${strip.foil.name}, ${strip.finish.name}`,
        detail: `outer face ${strip.outerFace.kind === 'foil' ? 'as supplied' : strip.outerFace.kind}, ${textureText(strip.outerFace.texture)}; dielectric face ${strip.dielectricFace.kind}, ${textureText(strip.dielectricFace.texture)}`,
        thicknessUm: um(strip.thickness.value),
        material: 'copper-strip',
        computed: true,
      },
      {
        label: `Laminate: ${laminate.material.name}`,
        detail: `permittivity ${statedNumber(laminate.material.permittivity.value)}, loss tangent ${statedNumber(laminate.material.lossTangent.value)}; thickness between the mean planes of the copper`,
        thicknessUm: um(laminate.thickness.value),
        material: 'dielectric',
        computed: true,
      },
      {
        label: `Ground: ${ground.foil.name}`,
        detail: `dielectric face ${ground.dielectricFace.kind}, ${textureText(ground.dielectricFace.texture)}`,
        thicknessUm: um(ground.thickness.value),
        material: 'copper-ground',
        computed: true,
      },
      ...below.map(({ name, thickness }) => ({
        label: name,
        detail: 'declared and drawn, not computed',
        thicknessUm: um(thickness),
        material: 'below' as const,
        computed: false,
      })),
    ],
  };
}

type Rectangle = ArrayDrawing['columns'][number]['rectangles'][number];

/** @param excitation amplitude of every patch of every column over the largest of the board, with where it was computed */
export function arrayDrawing(
  board: Board,
  excitation?: { readonly shares: readonly (readonly number[])[]; readonly note: string },
): ArrayDrawing {
  const columns = board.columns.map((column, i) => drawnColumn(column, i, excitation?.shares[i]));
  const all = columns.flatMap((c) => c.rectangles);
  const span = (low: (r: Rectangle) => number, high: (r: Rectangle) => number): readonly [number, number] => [
    Math.min(...all.map(low)),
    rounded(Math.max(...all.map(high)), 4),
  ];
  const { feedNetwork } = board;
  const driven = board.columns.flatMap(({ dummy }, i) => (dummy === true || board.feed[i]?.amplitude === 0 ? [] : [i]));
  return {
    drawing: 'array',
    columns,
    ...(feedNetwork === undefined
      ? {}
      : {
          network: {
            label: `Feed network (${feedNetwork.divider === 'tee' ? 'T-junctions' : 'Wilkinson dividers'}): schematic, not to scale`,
            driven,
          },
        }),
    extent: {
      x: span(
        (r) => r.x,
        (r) => r.x + r.length,
      ),
      y: span(
        (r) => r.y,
        (r) => r.y + r.width,
      ),
    },
    axisNotes: {
      x: board.columns.some(({ direction }) => direction === -1)
        ? 'x: along the columns'
        : 'x: along the columns, away from the feed',
      y: 'y: across the columns',
      tilt: 'Tilt is positive towards +x',
      polarisation: 'Electric field along x (linear)',
      cuts: 'Elevation cut: x-z (E plane). Azimuth cut: y-z (H plane)',
      ...(excitation === undefined ? {} : { amplitude: excitation.note }),
    },
  };
}
