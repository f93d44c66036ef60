import type { Chapter, DocumentPage, TitleBlock } from '../../dossier/document.js';
import { type BlockContext, cautionBoxes, paragraph } from './blocks.js';
import type { Box } from './flow.js';
import { baseline, bodyWidth, colours, page, type TypeSize, type } from './layout.js';
import { type Line, LineSetter } from './lines.js';
import { paintLine } from './paint-line.js';
import type { Element, Press } from './press.js';
import { bold, muted, plain, textRuns, topPlace } from './runs.js';

/** Kind of document, title and subtitle. */
export function titleBoxes(context: BlockContext, document: DocumentPage): Box[] {
  const { press, parent } = context;
  const kind = paragraph(
    context,
    textRuns(document.titleBlock.documentType, { face: 'sans', colour: colours.accent }),
    {
      before: 0,
    },
  );
  const heading = press.element('H1', parent);
  const title = new LineSetter(press, type.title.size).lines(textRuns(document.title, bold), bodyWidth);
  const boxes = title.map(
    (line, i): Box => ({
      before: i === 0 ? 2 : 0,
      height: type.title.leading,
      keep: true,
      paint: (top) => paintLine(press, line, type.title, page.left, top, heading, 'H1'),
    }),
  );
  const first: Box = {
    ...kind[0],
    paint: (top, height) => {
      press.markPlace(topPlace, 0);
      kind[0].paint(top, height);
    },
  };
  const subtitle = paragraph(context, textRuns(document.subtitle, muted), { before: 1, type: type.lead });
  return [first, ...kind.slice(1), ...boxes, ...subtitle];
}

interface Field {
  readonly label: string;
  readonly value: string;
  /** Width in twelfths of the body. */
  readonly span: number;
}

/** Data fields of ISO 7200; the number of sheets is known at the end. */
function titleBlockRows(block: TitleBlock): Field[][] {
  return [
    [
      { label: 'Legal owner', value: block.legalOwner, span: 6 },
      { label: 'Document number', value: block.identificationNumber, span: 4 },
      { label: 'Revision', value: block.revision, span: 2 },
    ],
    [
      { label: 'Title', value: block.title, span: 6 },
      { label: 'Supplementary title', value: block.supplementaryTitle ?? '', span: 6 },
    ].filter((field) => field.value !== '' || field.label === 'Title'),
    [
      { label: 'Document type', value: block.documentType, span: 6 },
      { label: 'Document status', value: block.documentStatus, span: 4 },
      { label: 'Language', value: block.language, span: 2 },
    ],
    [
      { label: 'Created by', value: block.creator, span: 3 },
      { label: 'Approved by', value: block.approver, span: 3 },
      { label: 'Date of issue', value: block.dateOfIssue, span: 4 },
      { label: 'Sheet', value: sheetField, span: 2 },
    ],
  ];
}
const sheetField = '\u0000sheet';

const inset = 5;

/** The title block: a grid of fields, each with its name over its value. */
export function titleBlockBoxes(context: BlockContext, block: TitleBlock, sheets: () => number): Box[] {
  const { press, parent } = context;
  const list = press.element('L', parent);
  const labelSetter = new LineSetter(press, type.furniture.size);
  const valueSetter = new LineSetter(press, type.body.size);
  const rows = titleBlockRows(block);
  return rows.flatMap((fields, rowIndex): Box[] => {
    const spans = fields.reduce((sum, field) => sum + field.span, 0);
    let x: number = page.left;
    const cells = fields.map((field) => {
      const width = (bodyWidth * field.span) / spans;
      const entry = press.element('LI', list);
      const cell = {
        x,
        width,
        field,
        label: labelSetter.lines(textRuns(field.label, muted), width - 2 * inset)[0],
        lines: valueSetter.lines(textRuns(field.value === sheetField ? '' : field.value, plain), width - 2 * inset),
        labelElement: press.element('Lbl', entry),
        valueElement: press.element('LBody', entry),
      };
      x += width;
      return cell;
    });
    const count = Math.max(...cells.map((cell) => cell.lines.length));
    // A value of more than a page would not fit into one box: each line is a box of its own.
    return Array.from({ length: count }, (_, n): Box => {
      const [first, last] = [n === 0, n === count - 1];
      const head = first ? inset - 1 + type.furniture.leading : 0;
      const height = head + type.body.leading + (last ? inset - 1 : 0);
      return {
        before: first && rowIndex === 0 ? 12 : 0,
        height,
        keep: !last && count < 20,
        paint: (top) => {
          press.artifact('Layout', () => {
            const { doc } = press;
            doc.lineWidth(0.6).undash().strokeColor(colours.muted);
            for (const cell of cells) {
              doc.moveTo(cell.x, top).lineTo(cell.x, top + height);
              if (first) doc.moveTo(cell.x, top).lineTo(cell.x + cell.width, top);
              if (last && rowIndex === rows.length - 1) {
                doc.moveTo(cell.x, top + height).lineTo(cell.x + cell.width, top + height);
              }
            }
            doc
              .moveTo(page.right, top)
              .lineTo(page.right, top + height)
              .stroke();
          });
          for (const cell of cells) {
            const left = cell.x + inset;
            if (first) paintLine(press, cell.label, type.furniture, left, top + inset - 1, cell.labelElement, 'Lbl');
            if (cell.field.value === sheetField && first) {
              press.defer(() => {
                const [line] = valueSetter.lines(textRuns(`1 of ${sheets()}`, plain), cell.width);
                paintLine(press, line, type.body, left, top + head, cell.valueElement, 'LBody');
              });
            } else if (n < cell.lines.length) {
              paintLine(press, cell.lines[n], type.body, left, top + head, cell.valueElement, 'LBody');
            }
          }
        },
      };
    });
  });
}

/** The notices in full, once: on every page they stand as running feet, which are not part of the structure. */
export function noticeBoxes(context: BlockContext, notices: readonly string[]): Box[] {
  if (notices.length === 0) return [];
  return cautionBoxes(
    context,
    'H2',
    'Notices',
    notices.map((notice) => [notice]),
  );
}

/** List of chapters with links and page numbers, which are filled in at the end. */
export function contentsBoxes(
  context: BlockContext,
  chapters: readonly Chapter[],
  pageOf: (chapter: Chapter) => number,
): Box[] {
  const { press, parent } = context;
  if (chapters.length === 0) return [];
  const heading = press.element('H2', parent);
  const contents = press.element('TOC', parent);
  const set = type.body;
  const setter = new LineSetter(press, set.size);
  const [headLine] = new LineSetter(press, type.chapter.size).lines(textRuns('Contents', bold), bodyWidth);
  const head: Box = {
    before: 16,
    height: type.chapter.leading + 3,
    keep: true,
    paint: (top) => paintLine(press, headLine, type.chapter, page.left, top, heading, 'H2'),
  };
  const numberRoom = 34;
  const entries = chapters.flatMap((chapter): Box[] => {
    const item = press.element('Reference', press.element('TOCI', contents));
    const target = press.placeName(chapter.id);
    const lines = setter.lines([{ ...plain, text: chapter.title, target }], bodyWidth - numberRoom);
    return lines.map((line, i) => ({
      height: set.leading + 1,
      keep: i < lines.length - 1 && lines.length < 20,
      paint: (top) =>
        press.defer(() => {
          paintLine(press, line, set, page.left, top, item, 'Reference');
          if (i === lines.length - 1) paintPageNumber(press, setter, set, line, pageOf(chapter), target, item, top);
        }),
    }));
  });
  return [head, ...entries];
}

function paintPageNumber(
  press: Press,
  setter: LineSetter,
  set: TypeSize,
  after: Line,
  pageNumber: number,
  target: string | undefined,
  item: Element,
  top: number,
): void {
  const [number] = setter.lines([{ ...plain, text: String(pageNumber), target }], bodyWidth);
  const right = page.right - number.width;
  const y = top + baseline(set) - 0.5;
  press.artifact('Layout', () => {
    press.doc.moveTo(page.left + after.width + 5, y).lineTo(right - 5, y);
    press.doc.lineWidth(0.5).dash(0.5, { space: 3 }).stroke(colours.muted);
    press.doc.undash();
  });
  paintLine(press, number, set, right, top, item, 'Reference');
}
