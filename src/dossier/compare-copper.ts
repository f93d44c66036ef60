import { formatNumber } from '../quantity/index.js';
import type { BoardStudy, FaceState, RoughnessSide } from '../study/results.js';
import { cell, chapter, DASH, plainTable, prose } from './blocks.js';
import type { BoardContext } from './context.js';
import type { Cell, Chapter } from './document.js';
import { micrometres } from './figures.js';
import { GAP } from './values.js';

type Pair = readonly [BoardContext, BoardContext];

const PLACES: readonly (readonly [FaceState['place'], string])[] = [
  ['underside', 'Strip, face to the laminate'],
  ['ground', 'Ground, face to the laminate'],
  ['outer', 'Strip, outer face'],
];
const SIDES: readonly RoughnessSide[] = ['low', 'middle', 'high'];

/** `1.10 / 1.90 / 2.59`. */
const three = (text: (side: RoughnessSide) => string): string => SIDES.map(text).join(' / ');

const faceAt = ({ faces }: BoardStudy, place: FaceState['place']): FaceState | undefined =>
  faces.find((face) => face.place === place);

const bandText = (face: FaceState): string =>
  three((side) => formatNumber(face.band.find((entry) => entry.side === side)?.lossFactor ?? Number.NaN, 2));

function lossText({ lineLossByFace }: BoardStudy): string {
  if (lineLossByFace.length === 0) return DASH;
  const of = (side: RoughnessSide) => lineLossByFace.find((loss) => loss.side === side)?.total ?? Number.NaN;
  return `${three((side) => formatNumber(of(side) / 100, 3))}${GAP}dB/cm`;
}

function shiftText({ slowWave }: BoardStudy): string {
  if (slowWave.length === 0) return DASH;
  const of = (side: RoughnessSide) => slowWave.find((entry) => entry.side === side)?.resonanceShift ?? Number.NaN;
  const within = slowWave.every(({ applied }) => applied) ? '' : ' (in the design value)';
  return `${three((side) => formatNumber(of(side) / 1e6, 0))}${GAP}MHz${within}`;
}

/** Copper of both boards: what is known of each face, the band that follows, and what it makes of the feed line. */
export function copperComparison([a, b]: Pair): readonly Chapter[] {
  const studies = [a.study, b.study] as const;
  if (studies.some(({ faces }) => faces.length === 0)) return [];
  const both = (text: (study: BoardStudy) => string): readonly Cell[] => studies.map((study) => cell(text(study)));
  const faceRows = PLACES.map(([place, name]) => [
    cell(name),
    ...both((study) => {
      const face = faceAt(study, place);
      return face === undefined ? DASH : `Rq ${micrometres(face.rq)}; known: ${face.known}; K ${bandText(face)}`;
    }),
  ]);
  return [
    chapter(
      'copper',
      'Copper side by side',
      plainTable(
        'copper-table',
        'Low / middle / high estimate of the loss factor of each face, the loss of the feed line and the shift of resonance by texture, at the band centre',
        [
          { title: 'What', width: 1.1 },
          { title: a.board.id, width: 1.6 },
          { title: b.board.id, width: 1.6 },
        ],
        [
          ...faceRows,
          [cell('Loss of the feed line'), ...both(lossText)],
          [cell('Shift of resonance against smooth faces'), ...both(shiftText)],
        ],
      ),
      prose(
        'Faces of the same Rq may differ in what Rq cannot see: where the bands lie apart, the difference is known; where they overlap, a measurement would have to decide.',
      ),
    ),
  ];
}
