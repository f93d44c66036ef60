import { formatNumber } from '../quantity/index.js';
import type { FaceState } from '../study/results.js';
import { list, prose } from './blocks.js';
import { faceGroups } from './copper-faces.js';
import type { Block, Inline } from './document.js';
import { askName, askText, type TextureQuantity } from './texture-asks.js';

const k = (value: number): string => formatNumber(value, 2);

/** What would have to be measured to narrow the band, face by face, the most useful first, with what it would leave. */
export function narrowingBlocks(faces: readonly FaceState[]): readonly Block[] {
  const groups = faceGroups(faces);
  const open = groups.filter(({ face }) => face.narrowing.length > 0);
  const closed = groups.filter(({ face }) => face.narrowing.length === 0);
  const asked = [
    ...new Set(open.flatMap(({ face }) => face.narrowing.map(({ quantity }): TextureQuantity => quantity))),
  ];
  return [
    ...open.flatMap(({ name, face }) => [
      prose(
        { strong: `${name}. ` },
        `The band of the loss factor is ${k(face.narrowing[0].spreadNow)} wide. Each measurement alone would leave, on average over what it may find:`,
      ),
      list(
        face.narrowing.map(({ quantity, wouldNarrowTo }): readonly Inline[] => [
          { strong: k(wouldNarrowTo) },
          ` ${askName(quantity)}`,
        ]),
        true,
      ),
    ]),
    ...closed.map(({ name }) =>
      prose({ strong: `${name}. ` }, 'No further measurement among those considered would narrow the band.'),
    ),
    ...(asked.length === 0
      ? []
      : [
          prose('In the words of a request to the maker of the foil, as its sheet has them:'),
          list(asked.map((quantity): readonly Inline[] => [askText(quantity)])),
        ]),
  ];
}
