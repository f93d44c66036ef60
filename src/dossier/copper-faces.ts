import { formatNumber, formatQuantity } from '../quantity/index.js';
import type { FaceState } from '../study/results.js';
import { cell, number, prose, table } from './blocks.js';
import type { Block } from './document.js';
import { micrometres } from './figures.js';
import { modelTitle, sideTitle } from './model-words.js';

/** Faces of which exactly the same is known and found, named together. */
export interface FaceGroup {
  readonly name: string;
  readonly faces: readonly FaceState[];
  readonly face: FaceState;
}

/** Faces with the same texture on the same metal are one row: everything but their name and place is equal. */
export function faceGroups(faces: readonly FaceState[]): readonly FaceGroup[] {
  const groups = new Map<string, FaceState[]>();
  for (const state of faces) {
    const { face: _name, place: _place, ...rest } = state;
    const key = JSON.stringify(rest);
    groups.set(key, [...(groups.get(key) ?? []), state]);
  }
  return [...groups.values()].map((same) => ({ name: nameOf(same), faces: same, face: same[0] }));
}

/** `Strip underside (treated); ground (treated)`. */
function nameOf(faces: readonly FaceState[]): string {
  const names = faces.map(({ face }) => face.charAt(0).toLowerCase() + face.slice(1)).join('; ');
  return names.charAt(0).toUpperCase() + names.slice(1);
}

const length = (metres: number, decimals: number): string => formatQuantity(metres, 'length', { unit: 'um', decimals });

/** What is known of each face and the band that follows, one row an estimate. */
export function bandTable(faces: readonly FaceState[]): Block {
  return table(
    'faces',
    'What is known of each copper face, and the low, middle and high estimate that follow at the band centre and nominal temperature',
    [
      'Face|2',
      'Known|1.2',
      '#Rq|0.9',
      '#Rq / skin depth|0.8',
      'Estimate|1',
      '#Loss factor K|0.8',
      '#Slow-wave length|1',
      'Why|3.6',
    ],
    faceGroups(faces).flatMap(({ name, face: { known, rq, skinDepth, band } }) =>
      band.map(({ side, lossFactor, slowWaveLength, reason }) => [
        cell(name),
        cell(known),
        number(micrometres(rq)),
        number(formatNumber(rq / skinDepth, 2)),
        cell(sideTitle(side)),
        number(formatNumber(lossFactor, 2)),
        number(length(slowWaveLength, 2)),
        cell(reason),
      ]),
    ),
  );
}

/** Skin depths of the faces, and what the columns of the table mean. */
export function bandWords(faces: readonly FaceState[]): Block {
  const depths = [...new Set(faces.map(({ skinDepth }) => length(skinDepth, 3)))];
  return prose(
    `The skin depth is ${depths.join(' or ')}. K is the power lost over that of a smooth face. `,
    'The slow-wave length s = Xδ/2 + plane shift says how far below the electric field the magnetic field ends; half a skin depth when smooth. ',
    'The estimates follow from what is known of the texture; they are no bounds.',
  );
}

/** What each published or solved model says of a face, and whether it stands outside its range there; one table a texture. */
export function modelTables(faces: readonly FaceState[]): readonly Block[] {
  return faceGroups(faces).map(({ name, face: { models, saturation } }, n) =>
    table(
      `face-models-${n + 1}`,
      `${name}: what every model says that the knowledge suffices for, same conditions`,
      ['Model|1.4', '#Loss factor K', '#Reactance X', '#Plane shift', '#Slow-wave length', 'Range|3'],
      models.map(({ model, lossFactor, reactance, planeShift, slowWaveLength, flags }) => {
        const outside = flags.filter(({ severity }) => severity === 'outside').map(({ text }) => text);
        const stuck = saturation.some((entry) => entry.model === model) ? ['Saturated.'] : [];
        const words = [...stuck, ...outside].join(' ');
        return [
          cell(modelTitle(model)),
          number(formatNumber(lossFactor, 3)),
          number(formatNumber(reactance, 2)),
          number(planeShift === 0 ? '0' : length(planeShift, 2)),
          number(length(slowWaveLength, 2)),
          cell(words === '' ? 'in range' : words),
        ];
      }),
    ),
  );
}

/** A plain sentence per saturated model and texture, naming the faces. */
export function saturationBlocks(faces: readonly FaceState[]): readonly Block[] {
  return faceGroups(faces).flatMap(({ name, face }) =>
    face.saturation.map(({ text }) => prose({ strong: `${name}: ` }, text)),
  );
}
