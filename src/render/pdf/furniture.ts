import type { DocumentPage } from '../../dossier/document.js';
import { bodyWidth, colours, page, type } from './layout.js';
import { type Line, LineSetter } from './lines.js';
import { paintBareLine } from './paint-line.js';
import type { Press } from './press.js';
import { muted, plain, type Run, textRuns } from './runs.js';

const set = type.furniture;
const marking =
  'Calculated design evidence. Not a declaration of conformity, radio approval or RF-exposure assessment.';
const mostNoticeLines = 4;
const footBottom = page.height - 26;
/** The running head stands lower where a marking stands over it. */
const headShift = 4.5;

/** Running heads and feet of all pages: document number, title, revision, status, who may see it, notices, cautions, page x of y. */
export interface Furniture {
  /** Foot of the body. */
  readonly bodyBottom: number;
  /** Paints them on the current page. */
  readonly paint: (pageNumber: number, pageCount: number) => void;
}

export function furniture(press: Press, document: DocumentPage, packTitle: string): Furniture {
  const setter = new LineSetter(press, set.size);
  const { titleBlock: block } = document;
  // The front page prints the notices in full; the foot is cut aloud where they would take too much of every page.
  const all = setter.lines(textRuns(document.notices.join(' '), muted), bodyWidth);
  const notices = document.notices.length === 0 ? [] : shortened(press, all);
  const footTop = footBottom - (notices.length + 1) * set.leading - 4;

  const oneLine = (runs: readonly Run[], room: number): Line => shortened(press, setter.lines(runs, room), 1)[0];
  const half = bodyWidth / 2 - 8;
  const headLeft = oneLine(
    [
      { ...plain, face: 'bold', text: block.identificationNumber },
      { ...muted, text: `  ${document.title}` },
    ],
    half,
  );
  const headRight = oneLine(
    textRuns(
      `${document.title === packTitle ? '' : `${packTitle} · `}revision ${block.revision} · ${block.documentStatus}`,
      muted,
    ),
    half,
  );
  const { marking: audience } = document;
  const above = audience === undefined ? undefined : oneLine([{ ...plain, face: 'bold', text: audience }], bodyWidth);
  const headTop = page.headerTop + (above === undefined ? 0 : headShift);
  const mark = oneLine([{ ...plain, face: 'bold', text: marking }], bodyWidth - 70);
  const rule = (y: number) => {
    press.doc.moveTo(page.left, y).lineTo(page.right, y).lineWidth(0.5).undash().stroke(colours.rule);
  };

  return {
    bodyBottom: footTop - 10,
    paint: (pageNumber, pageCount) => {
      press.artifact('Pagination', () => {
        if (above) paintBareLine(press, above, set, page.left, headTop - set.leading);
        paintBareLine(press, headLeft, set, page.left, headTop);
        paintBareLine(press, headRight, set, page.right - headRight.width, headTop);
        rule(headTop + set.leading + 3);
      });
      press.artifact('Pagination', () => {
        rule(footTop);
        notices.forEach((line, i) => {
          paintBareLine(press, line, set, page.left, footTop + 4 + i * set.leading);
        });
        const last = footBottom - set.leading;
        paintBareLine(press, mark, set, page.left, last);
        const [count] = setter.lines(textRuns(`page ${pageNumber} of ${pageCount}`), bodyWidth);
        paintBareLine(press, count, set, page.right - count.width, last);
      });
    },
  };
}

/** The first lines; where more follow, the last ends in an ellipsis. */
function shortened(press: Press, lines: readonly Line[], most = mostNoticeLines): readonly Line[] {
  if (lines.length <= most) return lines;
  const last = lines[most - 1];
  const pieces = [...last.pieces];
  const end = pieces.pop();
  if (end === undefined) return lines.slice(0, most);
  const text = `${end.text.trimEnd().slice(0, -2).trimEnd()}…`;
  const width = press.widthOf(text, end.face, set.size);
  return [...lines.slice(0, most - 1), { pieces: [...pieces, { ...end, text, width }], width: end.x + width }];
}
