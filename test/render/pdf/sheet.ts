import type { SupplierSheet } from '../../../src/dossier/supplier-sheet.js';

/** A supplier sheet, invented, whose tables run over pages and ask for signatures. */
const codes = Array.from({ length: 90 }, (_, i) => `N-${i + 1}`);
export const sheet: SupplierSheet = {
  id: 'foil',
  title: 'Request for quotation NF-Q-7: copper foil',
  subtitle: 'To Maker F (invented).',
  rfqNumber: 'NF-Q-7',
  contact: 'Purchasing (role)',
  replyDate: '2026-12-18',
  issued: '2026-11-23',
  notice: 'Invented data.',
  chapters: [
    {
      id: 'items',
      title: 'Items to hold',
      blocks: [
        { kind: 'facts', id: 'request', items: [{ label: 'To', content: ['Maker F (invented)'] }] },
        {
          kind: 'table',
          id: 'items-table',
          caption: 'Items, with nominal value',
          rowHeaders: true,
          columns: [{ title: 'Item' }, { title: 'Nominal value', numeric: true }, { title: 'Reason' }],
          rows: codes.map((code, i) => [
            { content: [{ code }] },
            { content: [`${18 + i} µm`] },
            { content: ['The texture of the foil decides how much of the wave the copper takes.'] },
          ]),
        },
      ],
    },
    {
      id: 'terms',
      title: 'Terms',
      blocks: [
        {
          kind: 'list',
          items: [['The drawing prevails.'], ['See ', { text: 'items', page: 'supplier', anchor: 'items' }]],
        },
      ],
    },
  ],
  answerTable: [],
};
export const sheetCodes = codes;
