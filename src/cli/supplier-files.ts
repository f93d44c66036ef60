import { type SheetContent, sheetContent, supplierSheet } from '../dossier/index.js';
import type { Pack } from '../manifest/model.js';
import type { Files } from '../publish/index.js';
import { csvText } from '../render/csv.js';
import { renderSupplierPage } from '../render/html/index.js';
import { renderSupplierPdf } from '../render/pdf/index.js';
import type { ProcurementResults } from '../verdict/index.js';

/** Page, PDF and table of every recipient. From here on only what may leave is known. */
export async function supplierFiles(pack: Pack, results: ProcurementResults | undefined, date: Date): Promise<Files> {
  const files = new Map<string, Uint8Array | string>();
  const contents = (pack.procurement?.recipients ?? []).map(
    (recipient): SheetContent => sheetContent(pack, recipient, results?.allowances ?? new Map()),
  );
  for (const content of contents) {
    const sheet = supplierSheet(content);
    files.set(`supplier/${sheet.id}.html`, await renderSupplierPage(sheet));
    files.set(`supplier/${sheet.id}.csv`, csvText(sheet.answerTable));
    files.set(`pdf/supplier-${sheet.id}.pdf`, await renderSupplierPdf(sheet, date));
  }
  return files;
}
