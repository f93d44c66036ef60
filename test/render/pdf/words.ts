import type { DocumentPage, Inline } from '../../../src/dossier/document.js';
import { safeText } from '../../../src/render/pdf/safe-text.js';
import { packDocument } from '../fixture-document.js';
import { squeeze } from './reading.js';

export const pdfContext = {
  packTitle: packDocument.title,
  revision: packDocument.revision,
  date: new Date('2026-11-16T00:00:00Z'),
  pageTitle: (id: string) => packDocument.pages.find((page) => page.id === id)?.title,
};

export const pageOf = (id: string): DocumentPage => packDocument.pages.find((page) => page.id === id)!;

const words = (content: readonly Inline[]): string =>
  content
    .map((item) => {
      if (typeof item === 'string') return item;
      if ('strong' in item) return item.strong;
      if ('code' in item) return item.code;
      return 'status' in item ? item.status : item.text;
    })
    .join('');

/** Every text that must stand in the body of the document, each without spaces and as far as it can be printed. */
export function expectedTexts(document: DocumentPage): string[] {
  const { titleBlock: block } = document;
  const texts = [document.title, document.subtitle, ...document.notices, block.legalOwner, block.identificationNumber];
  texts.push(block.revision, block.dateOfIssue, block.title, block.documentType, block.documentStatus);
  texts.push(block.creator, block.approver);
  if (block.supplementaryTitle !== undefined) texts.push(block.supplementaryTitle);
  for (const chapter of document.chapters) {
    texts.push(chapter.title);
    for (const item of chapter.blocks) {
      switch (item.kind) {
        case 'prose':
        case 'verdict':
          texts.push(...item.content.map((part) => words([part])));
          break;
        case 'list':
          texts.push(...item.items.flatMap((entry) => entry.map((part) => words([part]))));
          break;
        case 'facts':
          texts.push(...item.items.flatMap((fact) => [fact.label, words(fact.content)]));
          break;
        case 'caution':
          texts.push(item.title, ...item.content.flatMap((entry) => entry.map((part) => words([part]))));
          break;
        case 'figure':
          texts.push(item.title, item.reading);
          break;
        case 'table':
          texts.push(item.caption, ...item.columns.map((column) => column.title));
          texts.push(...item.rows.flatMap((row) => row.map((cell) => words(cell.content))));
          break;
      }
    }
  }
  return texts.map((text) => squeeze(safeText(text)));
}
