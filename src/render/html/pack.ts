import { printable } from '../../chart/svg.js';
import type { DocumentPage, PackDocument, PageKind, TitleBlock } from '../../dossier/document.js';
import { checkElementId, checkRelativeHref, pagePath, relativeLink } from './paths.js';
import { styleSheet } from './style.js';
import { fillTemplate } from './templates.js';
import { blockView, type LinkTo } from './view.js';

const kindNames: Readonly<Record<PageKind, string>> = {
  overview: 'Overview of the pack',
  pack: 'The whole pack',
  dossier: 'Dossier of one board',
  compare: 'Two boards side by side',
  requirement: 'One requirement across all boards',
  offers: 'Suppliers: allowances and offers',
  evidence: 'Evidence: methods and checks',
  definitions: 'Definitions',
};

/** Ids of the skeleton of every page, which chapters and blocks must not take. */
const skeletonIds = ['main', 'contents'];

/**
 * Every page of a revision with its style sheet: path below the folder of the revision -> text.
 *
 * @throws Error on an unsafe id, two pages of one path, or a link that leads nowhere: faults of ours, not of the user
 */
export async function renderPack(document: PackDocument): Promise<Map<string, string>> {
  const pack = printable(document);
  const pages = pack.pages.map((page) => ({ page, path: pagePath(page.id), ids: elementIds(page) }));
  const files = new Map<string, string>();
  const lower = new Set<string>();
  for (const { path } of pages) {
    // Some file systems do not tell a from A.
    if (lower.has(path.toLowerCase())) throw new Error(`two pages at ${path}`);
    lower.add(path.toLowerCase());
  }
  const anchors = new Map(pages.map(({ page, path, ids }) => [page.id, { path, ids: new Set(ids) }]));

  for (const { page, path, ids } of pages) {
    const toPage: LinkTo['page'] = (id, anchor) => {
      const target = anchors.get(id);
      if (target === undefined || (anchor !== undefined && !target.ids.has(anchor))) {
        throw new Error(`${page.id}: link to ${id}${anchor === undefined ? '' : `#${anchor}`} leads nowhere`);
      }
      if (id === page.id && anchor !== undefined) return `#${anchor}`;
      return relativeLink(path, target.path) + (anchor === undefined ? '' : `#${anchor}`);
    };
    const linkTo: LinkTo = { page: toPage, file: (target) => relativeLink(path, checkRelativeHref(target)) };
    files.set(path, fillTemplate('page', await pageView(pack, page, path, ids, linkTo)));
  }
  files.set('style.css', styleSheet());
  return files;
}

/** Element ids of a page in reading order. Where a block would repeat an id it gets a number behind it. */
function elementIds(page: DocumentPage): readonly string[] {
  const taken = new Set(skeletonIds);
  const ids: string[] = [];
  for (const wanted of wantedIds(page)) {
    let id = checkElementId(wanted);
    for (let count = 2; taken.has(id); count += 1) id = `${wanted}-${count}`;
    taken.add(id);
    ids.push(id);
  }
  return ids;
}

function wantedIds(page: DocumentPage): readonly string[] {
  return page.chapters.flatMap((chapter) => [
    chapter.id,
    ...chapter.blocks.flatMap((block) => ('id' in block ? [block.id] : [])),
  ]);
}

async function pageView(
  pack: PackDocument,
  page: DocumentPage,
  path: string,
  ids: readonly string[],
  linkTo: LinkTo,
): Promise<object> {
  let next = 0;
  const takeId = () => ids[next++];
  const chapters = [];
  for (const chapter of page.chapters) {
    const id = takeId();
    const blocks = [];
    for (const block of chapter.blocks) blocks.push(await blockView(block, linkTo, takeId));
    chapters.push({ id, title: chapter.title, blocks });
  }
  return {
    packTitle: pack.title,
    kind: page.kind,
    isOverview: page.kind === 'overview',
    title: page.title,
    subtitle: page.subtitle,
    revision: page.titleBlock.revision,
    status: page.titleBlock.documentStatus,
    documentType: page.titleBlock.documentType,
    kindName: kindNames[page.kind],
    // The same dossier on paper; other pages have no sheet of their own.
    paper: page.kind === 'dossier' ? relativeLink(path, `pdf/${page.id.replace(/^board\//, '')}.pdf`) : '',
    style: relativeLink(path, 'style.css'),
    home: relativeLink(path, pagePath('overview')),
    marking: page.marking ?? '',
    notices: page.notices,
    // The first notice says what the data are: it stands at the head; all of them stand at the foot.
    headNotices: page.notices.slice(0, 1),
    navigation: navigationView(pack, page, path),
    titleBlock: titleBlockView(page.titleBlock),
    chapters,
  };
}

function navigationView(pack: PackDocument, current: DocumentPage, path: string) {
  const links = (kinds: readonly PageKind[]) =>
    pack.pages
      .filter((page) => kinds.includes(page.kind))
      .map((page) => ({
        title: page.kind === 'overview' ? 'Overview' : page.title,
        href: relativeLink(path, pagePath(page.id)),
        current: page.id === current.id,
      }));
  const requirements = links(['requirement']);
  return {
    first: links(['overview', 'dossier']),
    requirements,
    hasRequirements: requirements.length > 0,
    inRequirements: current.kind === 'requirement',
    last: links(['offers', 'evidence', 'definitions']),
  };
}

/** Data fields of ISO 7200 in the words of that standard; what a page lacks is left out. */
function titleBlockView(block: TitleBlock) {
  const fields: readonly (readonly [string, string | undefined])[] = [
    ['Legal owner', block.legalOwner],
    ['Identification number', block.identificationNumber],
    ['Revision', block.revision],
    ['Date of issue', block.dateOfIssue],
    ['Title', block.title],
    ['Supplementary title', block.supplementaryTitle],
    ['Document type', block.documentType],
    ['Document status', block.documentStatus],
    ['Creator', block.creator],
    ['Approver', block.approver],
    ['Language', block.language],
    ['Segment', block.segment],
  ];
  return fields.flatMap(([label, value]) => (value === undefined ? [] : [{ label, value }]));
}
