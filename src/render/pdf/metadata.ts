import type { DocumentPage } from '../../dossier/document.js';
import { escapeXml, safeText } from './safe-text.js';

const producer = 'Boardcase';

/** The information dictionary: fixed names of the program and the given date, so that same input gives same bytes. */
export function documentInfo(
  document: DocumentPage,
  packTitle: string,
  revision: string,
  date: Date,
): PDFKit.DocumentInfo {
  const { titleBlock: block } = document;
  return {
    Title: safeText(`${block.identificationNumber} ${document.title}, revision ${block.revision}`),
    Author: safeText(block.creator),
    Subject: safeText(`${block.documentType}; ${packTitle}, revision ${revision}`),
    Producer: producer,
    Creator: producer,
    CreationDate: date,
    ModDate: date,
  };
}

/** The same as XMP, escaped, which pdfkit leaves undone. */
export function xmpDescription(info: PDFKit.DocumentInfo, date: Date): string {
  const time = `${date.toISOString().slice(0, 19)}Z`;
  const text = (value: string | undefined) => escapeXml(value ?? '');
  const alternatives = (value: string | undefined) =>
    `<rdf:Alt><rdf:li xml:lang="x-default">${text(value)}</rdf:li></rdf:Alt>`;
  return `<rdf:Description rdf:about="" xmlns:xmp="http://ns.adobe.com/xap/1.0/">
<xmp:CreateDate>${time}</xmp:CreateDate>
<xmp:ModifyDate>${time}</xmp:ModifyDate>
<xmp:CreatorTool>${text(info.Creator)}</xmp:CreatorTool>
</rdf:Description>
<rdf:Description rdf:about="" xmlns:dc="http://purl.org/dc/elements/1.1/">
<dc:title>${alternatives(info.Title)}</dc:title>
<dc:creator><rdf:Seq><rdf:li>${text(info.Author)}</rdf:li></rdf:Seq></dc:creator>
<dc:description>${alternatives(info.Subject)}</dc:description>
</rdf:Description>
<rdf:Description rdf:about="" xmlns:pdf="http://ns.adobe.com/pdf/1.3/">
<pdf:Producer>${text(info.Producer)}</pdf:Producer>
</rdf:Description>`;
}
