import { createRequire } from 'node:module';
import PDFDocument from 'pdfkit';
import { boldFontPath, regularFontPath } from '../../chart/font.js';
import { claimAccessibility } from './claims.js';
import { page } from './layout.js';
import { replacementSign, safeText } from './safe-text.js';

export type Face = 'sans' | 'bold' | 'mono';

/** By path in every call: pdfkit opens a file again each time when it knows the same font under another name. */
const facePaths: Readonly<Record<Face, string>> = {
  sans: regularFontPath,
  bold: boldFontPath,
  mono: createRequire(import.meta.url).resolve('dejavu-fonts-ttf/ttf/DejaVuSansMono.ttf'),
};

/**
 * Tables of the font files as they were decoded before, by path. Only these are shared between documents: the glyphs of
 * an opened font note the text that they were first made for, and would carry it from one document into the next.
 */
const decodedTables = new Map<string, unknown>();

export type Element = PDFKit.PDFStructureElement;
/** Text of one face and one direction of writing. */
export interface Glyphs {
  readonly text: string;
  readonly face: Face;
  readonly fromRight: boolean;
}

const rightToLeft = /[\u0590-\u08FF\uFB1D-\uFDFF\uFE70-\uFEFF]|[\u{10800}-\u{10FFF}\u{1E800}-\u{1EFFF}]/u;

/**
 * The document being written: fonts, measuring, tagging, named places. All painting goes through here, so that
 * everything on a page is either tagged content or an artifact.
 */
export class Press {
  readonly doc: PDFKit.PDFDocument;
  /** Counted from 0; −1 before the first page. */
  pageIndex = -1;
  private readonly widths = new Map<string, number>();
  private readonly covered = new Map<string, boolean>();
  private readonly places = new Map<string, string>();
  private readonly placed = new Set<string>();
  private readonly deferred: { readonly pageIndex: number; readonly paint: () => void }[] = [];

  constructor(info: PDFKit.DocumentInfo) {
    this.doc = new PDFDocument({
      size: [page.width, page.height],
      margin: 0,
      autoFirstPage: false,
      bufferPages: true,
      pdfVersion: '1.7',
      subset: 'PDF/A-3a',
      tagged: true,
      lang: 'en',
      displayTitle: true,
      font: facePaths.sans,
      info,
    });
    claimAccessibility(this.doc);
    for (const path of Object.values(facePaths)) {
      const { font } = this.doc.font(path)._font;
      const known = decodedTables.get(path);
      if (known === undefined) decodedTables.set(path, font._tables);
      else font._tables = known;
    }
    this.doc.outline.options = { ...this.doc.outline.options, expanded: true };
  }

  newPage(): void {
    this.doc.addPage();
    this.pageIndex += 1;
  }

  /** Paints on the current page once all pages exist: page numbers are known only then. */
  defer(paint: () => void): void {
    this.deferred.push({ pageIndex: this.pageIndex, paint });
  }

  paintDeferred(): void {
    for (const { pageIndex, paint } of this.deferred) {
      this.doc.switchToPage(pageIndex);
      paint();
    }
  }

  // ------------------------------------------------------------------ text

  private covers(face: Face, sign: string): boolean {
    const key = `${face}${sign}`;
    let known = this.covered.get(key);
    if (known === undefined) {
      known = this.doc.font(facePaths[face])._font.font.hasGlyphForCodePoint(sign.codePointAt(0)!);
      this.covered.set(key, known);
    }
    return known;
  }

  /**
   * Text split by the face that has its glyphs: the wished one, else the regular one, else the replacement sign. Split
   * by direction too: a text that mixes both would be turned round as a whole.
   */
  glyphs(text: string, wished: Face): Glyphs[] {
    const parts: { text: string; face: Face; fromRight: boolean }[] = [];
    for (const sign of safeText(text)) {
      const face = this.covers(wished, sign) ? wished : this.covers('sans', sign) ? 'sans' : undefined;
      const fromRight = face !== undefined && rightToLeft.test(sign);
      const part = { text: face === undefined ? replacementSign : sign, face: face ?? wished, fromRight };
      const last = parts.at(-1);
      if (last?.face === part.face && last.fromRight === fromRight) last.text += part.text;
      else parts.push(part);
    }
    return parts;
  }

  /** Advance of a text whose glyphs the face has. */
  widthOf(text: string, face: Face, size: number): number {
    const key = `${face}${text}`;
    let known = this.widths.get(key);
    if (known === undefined) {
      known = this.doc.font(facePaths[face]).fontSize(1000).widthOfString(text);
      this.widths.set(key, known);
    }
    return (known * size) / 1000;
  }

  /** Paints a text whose glyphs the face has; `y` is the baseline. */
  paintText(text: string, face: Face, size: number, colour: string, x: number, y: number): void {
    this.doc.font(facePaths[face]).fontSize(size).fillColor(colour);
    this.doc.text(text, x, y, { lineBreak: false, baseline: 'alphabetic' });
  }

  // ------------------------------------------------------------------ structure

  element(type: string, parent?: Element, options: PDFKit.Mixins.StructureElementOptions = {}): Element {
    const element = this.doc.struct(type, options);
    if (parent === undefined) this.doc.addStructure(element);
    else parent.add(element);
    return element;
  }

  /** A list whose labels are bullets or numbers; `Disc` and `Decimal` are the names of PDF for these. */
  list(parent: Element, numbering: 'Disc' | 'Decimal'): Element {
    const list = this.element('L', parent);
    list.dictionary.data.A = { O: 'List', ListNumbering: numbering };
    return list;
  }

  tagged(element: Element, tag: string, paint: () => void): void {
    const content = this.doc.markStructureContent(tag);
    paint();
    this.doc.endMarkedContent();
    element.add(content);
  }

  /** Rules, grounds, running heads: what a reader of the structure must not hear. */
  artifact(type: 'Pagination' | 'Layout', paint: () => void): void {
    this.doc.markContent('Artifact', { type });
    paint();
    this.doc.endMarkedContent();
  }

  /**
   * A link to a place in this document, around the content that `paint` writes. It is closed before it joins its
   * parent, because pdfkit then notes the page that is current as the page of the annotation.
   */
  link(
    parent: Element,
    target: string,
    label: string,
    area: { readonly x: number; readonly y: number; readonly width: number; readonly height: number },
    paint: () => void,
  ): void {
    const link = this.doc.struct('Link');
    this.tagged(link, 'Link', paint);
    this.doc.goTo(area.x, area.y, area.width, area.height, target, {
      structParent: link,
      // A String object becomes a PDF string, a plain one a PDF name.
      Contents: Object(label) as string,
    });
    link.end();
    parent.add(link);
  }

  // ------------------------------------------------------------------ places to link to

  /** Names by which places are linked: our own, so that no outside text gets into them. */
  declarePlace(id: string): void {
    if (!this.places.has(id)) this.places.set(id, `place-${String(this.places.size).padStart(4, '0')}`);
  }

  placeName(id: string): string | undefined {
    return this.places.get(id);
  }

  /** The place is here. The first block of an id keeps it. */
  markPlace(id: string, top: number): void {
    const name = this.places.get(id);
    if (name === undefined || this.placed.has(id)) return;
    this.placed.add(id);
    this.doc.addNamedDestination(name, 'XYZ', page.left, top, null);
  }

  /** An entry of the outline that leads here. */
  outline(title: string, top: number): void {
    // Zoom 0 keeps the reader's zoom; pdfkit counts `left` from the right edge.
    this.doc.outline.addItem(safeText(title), { pageNumber: this.pageIndex, fit: false, left: page.width, top });
  }
}
