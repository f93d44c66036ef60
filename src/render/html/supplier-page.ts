import { printable } from '../../chart/svg.js';
import type { SupplierSheet } from '../../dossier/supplier-sheet.js';
import { checkElementId } from './paths.js';
import { styleSheet } from './style.js';
import { fillTemplate } from './templates.js';
import { blockView, type LinkTo } from './view.js';

/** A sheet links nowhere: what it could lead to stays inside. */
const noLinks: LinkTo = {
  page: (page) => {
    throw new Error(`a supplier sheet links to page ${page}`);
  },
  file: (path) => {
    throw new Error(`a supplier sheet links to file ${path}`);
  },
};

/** A supplier sheet as one page that stands alone: its style is in it, it has no navigation and leads nowhere. */
export async function renderSupplierPage(data: SupplierSheet): Promise<string> {
  const sheet = printable(data);
  const chapters = [];
  for (const { id, title, blocks } of sheet.chapters) {
    const views = [];
    for (const block of blocks) views.push(await blockView(block, noLinks, checkElementId));
    chapters.push({ id: checkElementId(id), title, blocks: views });
  }
  const { title, subtitle, rfqNumber, issued, replyDate, notice = '' } = sheet;
  return fillTemplate('supplier', {
    style: styleSheet(),
    title,
    subtitle,
    rfqNumber,
    issued,
    replyDate,
    notice,
    chapters,
  });
}
