export { type Attachment, type PdfContext, renderPdf } from './render-pdf.js';
export { renderSupplierPdf } from './supplier-pdf.js';
