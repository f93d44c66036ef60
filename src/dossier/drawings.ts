import type { Board, ColumnLayout, Texture } from '../manifest/model.js';
import type { ArrayDrawing, StackUpDrawing } from './document.js';
import { micrometres } from './figures.js';
import { rounded, statedNumber } from './values.js';

const um = (metres: number): number => rounded(metres * 1e6, 3);
const mm = (metres: number): number => rounded(metres * 1e3, 4);

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

/** Rectangles of a column from the feed line to the last patch; x and y of a rectangle are its lower corner, mm. */
function rectanglesOf(column: ColumnLayout): readonly Rectangle[] {
  const rectangle = (kind: Rectangle['kind'], x: number, length: number, width: number): Rectangle => ({
    kind,
    x: mm(x),
    y: mm(column.y - width / 2),
    length: mm(length),
    width: mm(width),
  });
  const { feedLine, patches, links } = column;
  const rectangles = [rectangle('line', column.x - feedLine.length, feedLine.length, feedLine.width)];
  let x = column.x;
  patches.forEach((patch, i) => {
    rectangles.push(rectangle('patch', x, patch.length, patch.width));
    x += patch.length;
    const link = links[i];
    if (link !== undefined) {
      rectangles.push(rectangle('line', x, link.length, link.width));
      x += link.length;
    }
  });
  return rectangles;
}

export function arrayDrawing(board: Board): ArrayDrawing {
  const columns = board.columns.map((column, i) => ({ label: `Column ${i + 1}`, rectangles: rectanglesOf(column) }));
  const all = columns.flatMap((c) => c.rectangles);
  const span = (low: (r: Rectangle) => number, high: (r: Rectangle) => number): readonly [number, number] => [
    Math.min(...all.map(low)),
    rounded(Math.max(...all.map(high)), 4),
  ];
  return {
    drawing: 'array',
    columns,
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
      x: 'x: along the columns, away from the feed',
      y: 'y: across the columns',
      tilt: 'Tilt is positive towards +x',
      polarisation: 'Electric field along x (linear)',
      cuts: 'Elevation cut: x-z (E plane). Azimuth cut: y-z (H plane)',
    },
  };
}
