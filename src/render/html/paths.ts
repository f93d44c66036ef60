/**
 * Where pages lie and how they link. Page ids are made by the dossier from checked slugs; what is not such an id is a
 * fault of ours and stops the build rather than becoming a path or a link.
 */
const slug = /^[A-Za-z0-9]+(?:(?:--|[-_.])[A-Za-z0-9]+)*$/;

/** Ids of chapters and blocks; the double underscore is kept for ids that pages derive from them. */
const elementId = /^[A-Za-z][A-Za-z0-9]*(?:[-_][A-Za-z0-9]+)*$/;

export function checkElementId(id: string): string {
  if (!elementId.test(id)) throw new Error(`not a safe element id: ${JSON.stringify(id)}`);
  return id;
}

/** Path of a page below the folder of its revision: `overview` is `index.html`, `board/qb-1` is `board/qb-1.html`. */
export function pagePath(id: string): string {
  const parts = id.split('/');
  if (parts.length > 2 || !parts.every((part) => slug.test(part))) {
    throw new Error(`not a safe page id: ${JSON.stringify(id)}`);
  }
  return id === 'overview' ? 'index.html' : `${id}.html`;
}

/** Relative link from one path of the revision to another; both are at most one folder deep. */
export function relativeLink(from: string, to: string): string {
  const [fromFolder, toFolder] = [from, to].map((path) => (path.includes('/') ? path.split('/')[0] : ''));
  if (fromFolder === '') return to;
  return fromFolder === toFolder ? to.slice(toFolder.length + 1) : `../${to}`;
}

/** A link handed in for the index: relative, downwards, of safe names only. */
export function checkRelativeHref(href: string): string {
  if (!href.split('/').every((part) => slug.test(part))) throw new Error(`not a safe link: ${JSON.stringify(href)}`);
  return href;
}
