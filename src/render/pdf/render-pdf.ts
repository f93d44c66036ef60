import type { Block, Chapter, DocumentPage, FigureBlock } from '../../dossier/document.js';
import { type Attachment, attach } from './attach.js';
import { type BlockContext, blockBoxes, paragraph } from './blocks.js';
import { fileStatement } from './claims.js';
import { figureBoxes } from './figure.js';
import { type Box, Flow, stackHeight } from './flow.js';
import { contentsBoxes, noticeBoxes, titleBlockBoxes, titleBoxes } from './front-page.js';
import { furniture } from './furniture.js';
import { bodyWidth, page, type } from './layout.js';
import { LineSetter } from './lines.js';
import { documentInfo, xmpDescription } from './metadata.js';
import { paintLine } from './paint-line.js';
import { type Picture, preparePicture } from './picture.js';
import { type Element, Press } from './press.js';
import { bold, muted, textRuns, topPlace } from './runs.js';
import { tableBoxes } from './table.js';

export interface PdfContext {
  readonly packTitle: string;
  readonly revision: string;
  /** Date of creation and change that the file states. */
  readonly date: Date;
  readonly attachments?: readonly Attachment[];
  readonly pageTitle: (pageId: string) => string | undefined;
}

/**
 * A page of the pack as a PDF document of its own: A4, tagged, with outline, contents, running heads and feet, charts
 * and drawings as vectors. Every font is embedded. The same input gives the same bytes. It claims PDF/A-3a and PDF/UA-1
 * and says at its end what is missing.
 */
export async function renderPdf(document: DocumentPage, context: PdfContext): Promise<Uint8Array> {
  const pictures = new Map<FigureBlock, Picture>();
  try {
    for (const block of document.chapters.flatMap((chapter) => chapter.blocks)) {
      if (block.kind === 'figure') pictures.set(block, await preparePicture(block));
    }
    return await write(document, context, pictures);
  } finally {
    for (const picture of pictures.values()) picture.finalize();
  }
}

function write(
  document: DocumentPage,
  context: PdfContext,
  pictures: ReadonlyMap<FigureBlock, Picture>,
): Promise<Uint8Array> {
  const { packTitle, revision, date, attachments = [] } = context;
  const info = documentInfo(document, packTitle, revision, date);
  const press = new Press(info);
  const { doc } = press;
  doc._addInfo = () => doc.appendXML(xmpDescription(info, date));
  const bytes = collect(doc);

  press.declarePlace(topPlace);
  for (const chapter of document.chapters) {
    press.declarePlace(chapter.id);
    for (const block of chapter.blocks) if ('id' in block) press.declarePlace(block.id);
  }
  const root = press.element('Document');
  const sheet = furniture(press, document, packTitle);
  const flow = new Flow(press, sheet.bodyBottom);
  const chapterPages = new Map<Chapter, number>();
  const within = (parent: Element): BlockContext => ({
    press,
    parent,
    pageId: document.id,
    pageTitle: context.pageTitle,
  });

  // Sections come into the structure in order, whatever is laid out first.
  const frontSection = within(press.element('Sect', root));
  const sections = document.chapters.map((chapter) => {
    const section = within(press.element('Sect', root));
    return [
      ...headingBoxes(section, chapter, () => chapterPages.set(chapter, press.pageIndex + 1)),
      ...chapter.blocks.flatMap((block) => boxesOf(block, section, flow.bodyHeight, pictures)),
    ];
  });
  const lastSection = within(press.element('Sect', root));
  flow.place(frontBoxes(frontSection, document, flow, sections, (chapter) => chapterPages.get(chapter) ?? 1));
  for (const section of sections) flow.place(section);
  flow.place(closingBoxes(lastSection, attachments));
  press.paintDeferred();
  const count = press.pageIndex + 1;
  for (let index = 0; index < count; index += 1) {
    doc.switchToPage(index);
    sheet.paint(index + 1, count);
  }
  for (const attachment of attachments) attach(doc, attachment, date);
  doc.end();
  return bytes;
}

/**
 * The front page. A first chapter with a verdict that does not fit under it starts on a page of its own, so that the
 * verdict and what it rests on are seen together; then the verdict is said on the front page as well.
 */
function frontBoxes(
  context: BlockContext,
  document: DocumentPage,
  flow: Flow,
  sections: Box[][],
  pageOf: (chapter: Chapter) => number,
): Box[] {
  const { press, parent } = context;
  const titleContext = { ...context, parent: press.element('Div', parent) };
  const restContext = { ...context, parent: press.element('Div', parent) };
  const title = titleBoxes(titleContext, document);
  const rest = [
    ...titleBlockBoxes(restContext, document.titleBlock, () => press.pageIndex + 1),
    ...noticeBoxes(restContext, document.notices),
    ...contentsBoxes(restContext, document.chapters, pageOf),
  ];
  const verdict = document.chapters[0]?.blocks.find((block) => block.kind === 'verdict');
  const height = stackHeight([...title, ...rest], true) + stackHeight(sections[0] ?? [], false);
  if (verdict === undefined || height <= flow.bodyHeight) return [...title, ...rest];
  sections[0][0] = { ...sections[0][0], newPage: true };
  return [...title, ...blockBoxes(verdict, titleContext), ...rest];
}

function boxesOf(
  block: Block,
  context: BlockContext,
  bodyHeight: number,
  pictures: ReadonlyMap<FigureBlock, Picture>,
): Box[] {
  if (block.kind === 'table') return tableBoxes(context, block, bodyHeight);
  if (block.kind === 'figure') {
    return figureBoxes(context.press, block, pictures.get(block)!, bodyHeight, context.parent);
  }
  return blockBoxes(block, context);
}

/** Heading of a chapter, with its place and its entry in the outline. */
export function headingBoxes({ press, parent }: BlockContext, chapter: Chapter, placed: () => void): Box[] {
  const element = press.element('H2', parent);
  const set = type.chapter;
  const lines = new LineSetter(press, set.size).lines(textRuns(chapter.title, bold), bodyWidth);
  return lines.map((line, i) => ({
    before: i === 0 ? 22 : 0,
    height: set.leading,
    keep: true,
    paint: (top) => {
      if (i === 0) {
        placed();
        press.markPlace(chapter.id, top);
        press.outline(chapter.title, top);
      }
      paintLine(press, line, set, page.left, top, element, 'H2');
    },
  }));
}

/** What the file is built to and what is attached to it. */
export function closingBoxes(context: BlockContext, attachments: readonly Attachment[] = []): Box[] {
  const named = attachments.map(({ name, description }) => `${name} (${description})`);
  return paragraph(context, textRuns(fileStatement(named), muted), { before: 16, type: type.small });
}

/** The bytes of a document once it is ended. */
export function collect(doc: PDFKit.PDFDocument): Promise<Uint8Array> {
  const chunks: Buffer[] = [];
  return new Promise((resolve, reject) => {
    doc.on('data', (chunk: Buffer) => chunks.push(chunk));
    doc.on('end', () => resolve(new Uint8Array(Buffer.concat(chunks))));
    doc.on('error', reject);
  });
}
