import { createHash } from 'node:crypto';
import { safeText } from './safe-text.js';

export interface Attachment {
  readonly name: string;
  /** Media type. */
  readonly type: string;
  readonly description: string;
  readonly data: Uint8Array;
}

/**
 * Attaches a file as data of the whole document (ISO 19005-3, 6.8). Not by `doc.file`, which writes the checksum as 32
 * letters where ISO 32000-1, table 46, asks for 16 bytes.
 */
export function attach(doc: PDFKit.PDFDocument, attachment: Attachment, date: Date): void {
  const { type, data } = attachment;
  const name = safeText(attachment.name);
  const file = doc.ref({
    Type: 'EmbeddedFile',
    Subtype: type.replace(/[^\w.+-]/g, (sign) => `#${sign.charCodeAt(0).toString(16).padStart(2, '0')}`),
    Params: {
      Size: data.length,
      CreationDate: date,
      ModDate: date,
      CheckSum: createHash('md5').update(data).digest(),
    },
  });
  file.end(Buffer.from(data));
  // A String object becomes a PDF string, a plain one a PDF name.
  const words = (text: string) => Object(text) as string;
  const specification = doc.ref({
    Type: 'Filespec',
    AFRelationship: 'Data',
    F: words(name),
    UF: words(name),
    Desc: words(safeText(attachment.description)),
    EF: { F: file, UF: file },
  });
  specification.end();
  doc.addNamedEmbeddedFile(name, specification);
  const { data: catalog } = doc._root;
  catalog.AF = [...(catalog.AF ?? []), specification];
}
