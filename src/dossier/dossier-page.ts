import { boardChapter } from './chapter-board.js';
import { budgetChapter } from './chapter-budget.js';
import { conditionsChapter } from './chapter-conditions.js';
import { copperChapter } from './chapter-copper.js';
import { couplingChapter } from './chapter-coupling.js';
import { enginesChapter } from './chapter-engines.js';
import { matchChapter } from './chapter-match.js';
import { materialsChapter } from './chapter-materials.js';
import { patternsChapter } from './chapter-patterns.js';
import { balanceChapter, cautionsChapter, inputsChapter, shortDefinitions, validityChapter } from './chapter-record.js';
import { uncertaintyChapter } from './chapter-uncertainty.js';
import { verdictChapter } from './chapter-verdict.js';
import { type BoardContext, page } from './context.js';
import type { DocumentPage } from './document.js';
import { boardPage, boardSuffix, boardTitle } from './links.js';

/** Dossier of one board; chapters in the order in which a reviewer decides. */
export function dossierPage(context: BoardContext): DocumentPage {
  const { board, verdict, input } = context;
  return page(input, {
    id: boardPage(board.id),
    kind: 'dossier',
    title: boardTitle(board),
    subtitle: `Verdict: ${verdict.overall}`,
    suffix: boardSuffix(board.id),
    chapters: [
      verdictChapter(context),
      boardChapter(context),
      budgetChapter(context),
      patternsChapter(context),
      matchChapter(context),
      ...couplingChapter(context),
      enginesChapter(context),
      copperChapter(context),
      conditionsChapter(context),
      uncertaintyChapter(context),
      materialsChapter(context),
      shortDefinitions(context),
      validityChapter(context),
      balanceChapter(context),
      inputsChapter(context),
      cautionsChapter(),
    ],
  });
}
