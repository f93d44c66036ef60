export type { Attachment } from './attach.js';
export { type PdfContext, renderPdf } from './render-pdf.js';
export { renderSupplierPdf } from './supplier-pdf.js';
