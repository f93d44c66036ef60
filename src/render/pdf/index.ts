export { type Attachment, type PdfContext, renderPdf } from './render-pdf.js';
