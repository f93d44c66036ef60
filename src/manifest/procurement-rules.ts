import { quoted } from '../quantity/index.js';
import type { ProcurementDocument, RecipientDocument } from './documents/procurement-document.js';
import type { Board, Pack } from './model.js';
import type { Path, Problem } from './problem.js';
import { exactlyOneOf, knownId, RuleReport } from './rules.js';
import type { Node } from './tree.js';

export type ProcurementContext = Pick<Pack, 'id' | 'title' | 'boards' | 'requirements'>;

export function procurementRules(
  root: Node,
  doc: ProcurementDocument,
  context: ProcurementContext,
): readonly Problem[] {
  const report = new RuleReport(root);
  samplingRules(report, doc);
  doc.recipients.forEach((recipient, i) => {
    const path: Path = ['recipients', i];
    const first = doc.recipients.findIndex(({ id }) => id === recipient.id);
    if (first < i)
      report.at([...path, 'id'], `${quoted(recipient.id)} a second time`, 'a recipient has an id of its own');
    boardRules(report, path, recipient, context.boards);
    materialRules(report, path, recipient, context.boards);
  });
  for (const { path, text } of sentTexts(doc)) nothingInside(report, path, text, doc, context);
  return report.problems;
}

function samplingRules(report: RuleReport, { sampling }: ProcurementDocument): void {
  const { confidence, reliability, plan } = sampling;
  if (
    !exactlyOneOf(
      report,
      ['sampling'],
      sampling,
      confidence === undefined ? ['reliability', 'plan'] : ['confidence', 'plan'],
    )
  )
    return;
  if (plan !== undefined) {
    if (reliability !== undefined)
      report.atKey(
        ['sampling', 'reliability'],
        'reliability beside a plan',
        'a plan stands alone',
        'Remove reliability.',
      );
  } else if (confidence === undefined || reliability === undefined) {
    const key = confidence === undefined ? 'confidence' : 'reliability';
    report.at(['sampling', key], `no key "${key}"`, 'confidence and reliability stand together');
  }
}

function boardRules(report: RuleReport, path: Path, { boards }: RecipientDocument, known: readonly Board[]): void {
  boards.forEach((id, i) => {
    const here = [...path, 'boards', i];
    knownId(report, here, id, 'board', { ids: new Set(known.map((board) => board.id)), complete: true });
    if (boards.indexOf(id) < i) report.at(here, `${quoted(id)} a second time`, 'a board is listed once');
  });
}

/** Library ids that a kind of recipient makes, as a board uses them. */
function usedOn(
  kind: RecipientDocument['kind'],
  { stackUp }: Board,
): readonly { readonly id: string; readonly maker: string }[] {
  return kind === 'laminate_maker' ? [stackUp.laminate.material] : [stackUp.strip.foil, stackUp.ground.foil];
}

function materialRules(report: RuleReport, path: Path, recipient: RecipientDocument, known: readonly Board[]): void {
  const { kind, materials } = recipient;
  if (kind === 'board_fabricator') {
    if (materials)
      report.atKey(
        [...path, 'materials'],
        'materials for a fabricator',
        'laminates and foils are asked of their makers',
        'Remove materials.',
      );
    return;
  }
  if (!materials) {
    const what = kind === 'laminate_maker' ? 'laminates' : 'foils';
    report.at([...path, 'materials'], 'no key "materials"', `a maker is asked for ${what} by their library ids`);
    return;
  }
  const boards = known.filter((board) => recipient.boards.includes(board.id));
  const used = new Map(boards.flatMap((board) => usedOn(kind, board)).map((material) => [material.id, material]));
  materials.forEach((id, i) => {
    const here = [...path, 'materials', i];
    if (materials.indexOf(id) < i) report.at(here, `${quoted(id)} a second time`, 'a material is listed once');
    else if (!used.has(id)) {
      report.at(here, quoted(id), `the boards of this recipient use ${[...used.keys()].join(', ') || 'none'}`);
    } else if (used.get(id)!.maker !== used.get(materials[0]!)?.maker) {
      report.at(
        here,
        `${quoted(id)} of ${used.get(id)!.maker}`,
        'what stands on one sheet comes from one maker',
        'Write a second recipient.',
      );
    }
  });
  if (!materials.every((id) => used.has(id))) return;
  boards.forEach((board) => {
    if (usedOn(kind, board).some(({ id }) => materials.includes(id))) return;
    const here = [...path, 'boards', recipient.boards.indexOf(board.id)];
    report.at(here, quoted(board.id), `a board that uses one of ${materials.join(', ')}`);
  });
}

/** Texts that are printed on sheets as they are written, with the recipient they go to where it is one. */
function sentTexts(doc: ProcurementDocument): readonly { readonly path: Path; readonly text: string }[] {
  const one = (path: Path, text: string | undefined) => (text === undefined ? [] : [{ path, text }]);
  return [
    ...one(['rfq_number'], doc.rfq_number),
    ...one(['contact', 'who'], doc.contact.who),
    ...one(['contact', 'address'], doc.contact.address),
    ...one(['nda'], doc.nda),
    ...doc.quantities.flatMap((text, i) => one(['quantities', i], text)),
    ...one(['certificate'], doc.certificate),
    ...one(['sampling', 'plan'], doc.sampling.plan),
    ...one(['texture', 'instrument'], doc.texture?.instrument),
    ...one(['texture', 'filter'], doc.texture?.filter),
    ...Object.entries(doc.verification ?? {}).flatMap(([key, entry]) => [
      ...one(['verification', key, 'method'], entry?.method),
      ...one(['verification', key, 'specimen'], entry?.specimen),
    ]),
    ...(doc.declare ?? []).flatMap((text, i) => one(['declare', i], text)),
    ...doc.recipients.flatMap((recipient, i) => [
      ...one(['recipients', i, 'id'], recipient.id),
      ...(recipient.quantities ?? []).flatMap((text, k) => one(['recipients', i, 'quantities', k], text)),
    ]),
  ];
}

/** A text that goes out names no board, not the pack, and none of the recipients or makers. */
function nothingInside(
  report: RuleReport,
  path: Path,
  text: string,
  doc: ProcurementDocument,
  context: ProcurementContext,
): void {
  const own = path[0] === 'recipients' ? doc.recipients[path[1] as number] : undefined;
  const makers = context.boards.flatMap(({ stackUp: { strip, laminate, ground } }) =>
    [laminate.material, strip.foil, ground.foil].flatMap(({ id, name, maker }) => [
      [name, 'a material'] as const,
      [id, 'a material'] as const,
      [maker, 'a maker'] as const,
    ]),
  );
  const inside: readonly (readonly [string, string])[] = [
    ...context.boards.flatMap(({ id, title }) => [[id, 'a board'] as const, [title, 'a board'] as const]),
    [context.id, 'the pack'],
    [context.title, 'the pack'],
    ...doc.recipients.map(({ name }) => [name, 'a recipient'] as const),
    ...makers,
  ];
  const named = inside.find(([name]) => name !== own?.name && mentions(text, name));
  if (named === undefined) return;
  report.at(
    path,
    report.written(path),
    `this is printed on sheets, and ${quoted(named[0])} is the name of ${named[1]}`,
    'Write it without the name.',
  );
}

/** As a word of its own: `side-1` is not in `side-10`. */
function mentions(text: string, name: string): boolean {
  const escaped = name.replace(/[\\^$.*+?()[\]{}|/]/g, '\\$&');
  return new RegExp(`(?<![\\p{L}\\p{N}-])${escaped}(?![\\p{L}\\p{N}-])`, 'iu').test(text);
}
