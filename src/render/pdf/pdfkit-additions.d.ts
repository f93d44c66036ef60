/** What pdfkit 0.20 offers and its published types lack. */
declare namespace PDFKit.Mixins {
  interface StructureElementOptions {
    /** Left, top, right, bottom in points from the top left. */
    bbox?: [number, number, number, number];
    placement?: 'Block' | 'Inline';
    scope?: 'Column' | 'Row' | 'Both';
  }
  interface AnnotationOption {
    structParent?: PDFKit.PDFStructureElement;
  }
  interface PDFVector {
    dash(lengths: number[], options?: { phase?: number }): this;
  }
}

declare namespace PDFKit {
  interface OutlineOptions {
    expanded?: boolean;
    pageNumber?: number;
    fit?: boolean;
    /** Distances that pdfkit takes off the top and the right edge of the page. */
    top?: number;
    left?: number;
  }
  interface PDFOutline {
    options: OutlineOptions;
    addItem(title: string, options?: OutlineOptions): PDFOutline;
  }
  interface PDFKitReference {
    end(): void;
  }
  interface PDFStructureElement {
    readonly dictionary: { readonly data: Record<string, unknown> };
  }
  interface PDFDocument {
    readonly _root: { readonly data: { AF?: PDFKitReference[] } };
    /** Writes the claims of conformance. */
    endSubset(): void;
    /** The font in use; `font` is the parsed file. */
    _font: { readonly font: { hasGlyphForCodePoint(code: number): boolean; _tables: unknown } };
    /** Writes the descriptive part of the XMP packet. */
    _addInfo(): void;
  }
}
