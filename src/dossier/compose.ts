import { comparisonPage } from './compare-page.js';
import { comparisonsOf } from './comparisons.js';
import { boardContexts, type PackInput } from './context.js';
import { definitionsPage } from './definitions-page.js';
import type { PackDocument } from './document.js';
import { dossierPage } from './dossier-page.js';
import { evidencePage } from './evidence-page.js';
import { offersPage } from './offers-page.js';
import { overviewPage } from './overview-page.js';
import { requirementPageOf } from './requirement-page.js';

/**
 * Every page of a pack as plain data.
 *
 * @throws RangeError when studies, verdicts and pack do not belong together, or an id could not name a page
 */
export function composePack(input: PackInput): PackDocument {
  const { pack } = input;
  const boards = boardContexts(input);
  const offers = offersPage(input);
  return {
    packId: pack.id,
    revision: pack.revision,
    title: pack.title,
    pages: [
      overviewPage(input, boards),
      ...boards.map(dossierPage),
      ...comparisonsOf(boards).pairs.map((pair) => comparisonPage(input, pair)),
      ...pack.requirements.requirements.map((requirement) => requirementPageOf(input, requirement, boards)),
      ...(offers === undefined ? [] : [offers]),
      evidencePage(input),
      definitionsPage(input),
    ],
  };
}
