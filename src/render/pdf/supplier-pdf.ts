import type { Block } from '../../dossier/document.js';
import type { SupplierSheet } from '../../dossier/supplier-sheet.js';
import { type BlockContext, blockBoxes, cautionBoxes, paragraph } from './blocks.js';
import { type Box, Flow } from './flow.js';
import { bodyWidth, colours, page, type } from './layout.js';
import { LineSetter } from './lines.js';
import { xmpDescription } from './metadata.js';
import { paintBareLine, paintLine } from './paint-line.js';
import { Press } from './press.js';
import { closingBoxes, collect, headingBoxes } from './render-pdf.js';
import { bold, muted, textRuns, topPlace } from './runs.js';
import { safeText } from './safe-text.js';
import { tableBoxes } from './table.js';

const set = type.furniture;
const footTop = page.height - 40;

/**
 * A supplier sheet as PDF: A4, tagged, with an outline. It has no attachment, no link out and, in its metadata, no name
 * but those printed on it. The same input gives the same bytes.
 *
 * @param date  date of creation and change that the file states
 */
export function renderSupplierPdf(sheet: SupplierSheet, date: Date): Promise<Uint8Array> {
  const info: PDFKit.DocumentInfo = {
    Title: safeText(sheet.title),
    Author: safeText(sheet.contact),
    Subject: safeText(`RFQ ${sheet.rfqNumber}, reply by ${sheet.replyDate}`),
    Producer: 'Boardcase',
    Creator: 'Boardcase',
    CreationDate: date,
    ModDate: date,
  };
  const press = new Press(info);
  const { doc } = press;
  doc._addInfo = () => doc.appendXML(xmpDescription(info, date));
  const bytes = collect(doc);
  press.declarePlace(topPlace);
  for (const chapter of sheet.chapters) press.declarePlace(chapter.id);

  const root = press.element('Document');
  const flow = new Flow(press, footTop - 10);
  const within = (): BlockContext => ({
    press,
    parent: press.element('Sect', root),
    pageId: 'supplier',
    pageTitle: () => undefined,
  });
  flow.place(titleBoxes(within(), sheet));
  for (const chapter of sheet.chapters) {
    const section = within();
    flow.place([
      ...headingBoxes(section, chapter, () => undefined),
      ...chapter.blocks.flatMap((block) => boxesOf(block, section, flow.bodyHeight)),
    ]);
  }
  flow.place(closingBoxes(within()));
  press.paintDeferred();
  const count = press.pageIndex + 1;
  for (let index = 0; index < count; index += 1) {
    doc.switchToPage(index);
    paintFurniture(press, sheet, index + 1, count);
  }
  doc.end();
  return bytes;
}

function boxesOf(block: Block, context: BlockContext, bodyHeight: number): Box[] {
  if (block.kind === 'table') return tableBoxes(context, block, bodyHeight);
  if (block.kind === 'figure') throw new Error('a supplier sheet has no figures');
  return blockBoxes(block, context);
}

function titleBoxes(context: BlockContext, sheet: SupplierSheet): Box[] {
  const { press, parent } = context;
  const heading = press.element('H1', parent);
  const lines = new LineSetter(press, type.title.size).lines(textRuns(sheet.title, bold), bodyWidth);
  const title = lines.map(
    (line, i): Box => ({
      height: type.title.leading,
      keep: true,
      paint: (top) => {
        if (i === 0) press.markPlace(topPlace, 0);
        paintLine(press, line, type.title, page.left, top, heading, 'H1');
      },
    }),
  );
  const subtitle = paragraph(context, textRuns(sheet.subtitle, muted), { before: 1, type: type.lead });
  const notice = sheet.notice === undefined ? [] : cautionBoxes(context, 'H2', 'Notice', [[sheet.notice]]);
  return [...title, ...subtitle, ...notice];
}

/** Running head and foot: request and reply date, what prevails, page x of y. */
function paintFurniture(press: Press, sheet: SupplierSheet, number: number, count: number): void {
  const setter = new LineSetter(press, set.size);
  const half = bodyWidth / 2 - 8;
  const rule = (y: number) => {
    press.doc.moveTo(page.left, y).lineTo(page.right, y).lineWidth(0.5).undash().stroke(colours.rule);
  };
  const [left] = setter.lines(textRuns(`RFQ ${sheet.rfqNumber}`, bold), half);
  const [right] = setter.lines(textRuns(`issued ${sheet.issued} · reply by ${sheet.replyDate}`, muted), half);
  const [prevails] = setter.lines(
    textRuns('The purchase order and the drawing prevail over this sheet.'),
    bodyWidth - 70,
  );
  const [pages] = setter.lines(textRuns(`page ${number} of ${count}`), 70);
  press.artifact('Pagination', () => {
    paintBareLine(press, left, set, page.left, page.headerTop);
    paintBareLine(press, right, set, page.right - right.width, page.headerTop);
    rule(page.headerTop + set.leading + 3);
  });
  press.artifact('Pagination', () => {
    rule(footTop);
    paintBareLine(press, prevails, set, page.left, footTop + 4);
    paintBareLine(press, pages, set, page.right - pages.width, footTop + 4);
  });
}
