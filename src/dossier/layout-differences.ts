import type { Board, ColumnLayout, Link } from '../manifest/model.js';
import { taperText } from './sizing.js';
import { statedNumber } from './values.js';

const mm = (metres: number): string => statedNumber(metres * 1e3, 6);
const degrees = (radians: number): string => `${statedNumber((radians * 180) / Math.PI, 4)}°`;
const size = ({ width, length }: Link): string => `${mm(width)} × ${mm(length)}`;

const perColumn = (board: Board, text: (column: ColumnLayout) => string): string => {
  const texts = board.columns.map(text);
  const distinct = [...new Set(texts)];
  return distinct.length === 1 ? distinct[0] : texts.map((t, i) => `column ${i + 1}: ${t}`).join('; ');
};

function sizedText({ sizedFor }: Board): string {
  if (sizedFor === undefined) return 'dimensions given';
  const { frequency, patches, taper, leastWidth, leastGap, grid } = sizedFor;
  return `${statedNumber(frequency / 1e9, 6)} GHz, ${patches} patches, taper ${taperText(taper)}; copper from ${mm(leastWidth)}, gaps from ${mm(leastGap)}, grid ${mm(grid)}`;
}

function networkText({ feedNetwork }: Board): string {
  if (feedNetwork === undefined) return 'none';
  const { divider, lineWidth, trunkLength, levelLength, transition } = feedNetwork;
  const behind =
    transition === undefined ? '' : `; transition ${transition.file}, ${statedNumber(transition.referenceImpedance)} Ω`;
  return `${divider}, lines ${mm(lineWidth)}, trunk ${mm(trunkLength)}, levels ${mm(levelLength)}${behind}`;
}

/** Fields of layout and feed that not every board has. */
export const LAYOUT_FIELDS: readonly { readonly label: string; readonly text: (board: Board) => string }[] = [
  {
    label: 'Direction of the columns',
    text: (b) => perColumn(b, ({ direction }) => (direction === -1 ? 'towards −x' : 'towards +x')),
  },
  {
    label: 'Columns never driven',
    text: ({ columns }) => columns.flatMap(({ dummy }, i) => (dummy === true ? [`${i + 1}`] : [])).join(', ') || 'none',
  },
  {
    label: 'Matching sections, width × length (mm)',
    text: (b) => perColumn(b, ({ matching = [] }) => matching.map(size).join(', ') || 'none'),
  },
  {
    label: 'Inset of the first patch, depth and gap (mm)',
    text: (b) => perColumn(b, ({ inset }) => (inset === undefined ? 'none' : `${mm(inset.depth)}, ${mm(inset.gap)}`)),
  },
  {
    label: 'Side feed',
    text: (b) =>
      perColumn(b, ({ sideFeed }) =>
        sideFeed === undefined ? 'none' : `link ${sideFeed.link + 1}, from ${sideFeed.side === 1 ? '+y' : '−y'}`,
      ),
  },
  {
    label: 'Width of the line into a load (mm)',
    text: (b) => perColumn(b, ({ termination }) => (termination === undefined ? 'no load' : mm(termination.width))),
  },
  { label: 'Sized for', text: sizedText },
  {
    label: 'Groups of columns',
    text: ({ groups = [] }) =>
      groups.map(({ id, columns }) => `${id}: ${columns.map((c) => statedNumber(c + 1)).join(', ')}`).join('; ') ||
      'none',
  },
  {
    label: 'Scan in azimuth',
    text: ({ scan }) => (scan === undefined ? 'none' : `${degrees(scan.low)} to ${degrees(scan.high)}`),
  },
  { label: 'Feed network', text: networkText },
];
