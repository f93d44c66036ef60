/** What the standards ask for and these files do not have; each is looked for by a test. */
const missing = [
  'words in other languages than English are not marked as such',
  'formulas are tagged as text',
  'lists of names and values state no numbering, since PDF 1.7 has none that fits',
];

/** One sentence on what the file is built to, printed at its end. */
export function fileStatement(attachments: readonly string[]): string {
  const attached = attachments.length === 0 ? '' : ` Attached: ${attachments.join(', ')}.`;
  return `This file is built to PDF/A-3a (ISO 19005-3) and PDF/UA-1 (ISO 14289-1); not certified; missing: ${missing.join('; ')}.${attached}`;
}

/**
 * Makes the document claim PDF/UA-1 beside PDF/A-3a, which pdfkit writes by itself. PDF/A allows a property outside of
 * its own list only where the file describes it (ISO 19005-3, 6.6.2.3).
 */
export function claimAccessibility(doc: PDFKit.PDFDocument): void {
  const endSubset = doc.endSubset.bind(doc);
  doc.endSubset = () => {
    endSubset();
    doc.appendXML(accessibilityClaim);
  };
}

const namespace = 'http://www.aiim.org/pdfua/ns/id/';
const accessibilityClaim = `<rdf:Description rdf:about="" xmlns:pdfuaid="${namespace}">
<pdfuaid:part>1</pdfuaid:part>
</rdf:Description>
<rdf:Description rdf:about="" xmlns:pdfaExtension="http://www.aiim.org/pdfa/ns/extension/" xmlns:pdfaSchema="http://www.aiim.org/pdfa/ns/schema#" xmlns:pdfaProperty="http://www.aiim.org/pdfa/ns/property#">
<pdfaExtension:schemas><rdf:Bag><rdf:li rdf:parseType="Resource">
<pdfaSchema:schema>Identification of PDF/UA</pdfaSchema:schema>
<pdfaSchema:namespaceURI>${namespace}</pdfaSchema:namespaceURI>
<pdfaSchema:prefix>pdfuaid</pdfaSchema:prefix>
<pdfaSchema:property><rdf:Seq><rdf:li rdf:parseType="Resource">
<pdfaProperty:name>part</pdfaProperty:name>
<pdfaProperty:valueType>Integer</pdfaProperty:valueType>
<pdfaProperty:category>internal</pdfaProperty:category>
<pdfaProperty:description>Part of ISO 14289 that the file is built to</pdfaProperty:description>
</rdf:li></rdf:Seq></pdfaSchema:property>
</rdf:li></rdf:Bag></pdfaExtension:schemas>
</rdf:Description>`;
