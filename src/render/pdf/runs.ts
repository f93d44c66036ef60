import type { Inline, Status } from '../../dossier/document.js';
import { colours } from './layout.js';
import type { Face, Press } from './press.js';
import { safeText } from './safe-text.js';

/** A stretch of text in one style. */
export interface Run {
  readonly text: string;
  readonly face: Face;
  readonly colour: string;
  /** Name of the place that it links to, inside this document. */
  readonly target?: string;
  /** Shape drawn before the first word. */
  readonly shape?: Status;
}

export interface RunStyle {
  readonly face: Face;
  readonly colour: string;
}
export const plain: RunStyle = { face: 'sans', colour: colours.ink };
export const bold: RunStyle = { face: 'bold', colour: colours.ink };
export const muted: RunStyle = { face: 'sans', colour: colours.muted };

/** What inline links are resolved against. */
export interface LinkContext {
  readonly press: Press;
  readonly pageId: string;
  readonly pageTitle: (pageId: string) => string | undefined;
}

/**
 * Links into this document stay links. A link to another page of the pack is plain text here, because that page is
 * another file; in running text the title of that page is named unless the words say it already.
 */
function linkRun(
  item: { text: string; page: string; anchor?: string },
  style: RunStyle,
  links: LinkContext,
  running: boolean,
): Run {
  if (item.page === links.pageId) {
    const target = links.press.placeName(item.anchor ?? topPlace);
    return target === undefined
      ? { ...style, text: item.text }
      : { ...style, text: item.text, colour: colours.accent, target };
  }
  const title = running ? safeText(links.pageTitle(item.page) ?? '') : '';
  const said = title === '' || item.text.toLowerCase().includes(title.toLowerCase());
  return { ...style, text: said ? item.text : `${item.text} (see “${title}”)` };
}

/** Id of the top of the document; a space keeps it apart from ids of blocks. */
export const topPlace = ' top';

export function inlineRuns(content: readonly Inline[], style: RunStyle, links: LinkContext, running = false): Run[] {
  return content.map((item): Run => {
    if (typeof item === 'string') return { ...style, text: item };
    if ('strong' in item) return { ...style, face: 'bold', text: item.strong };
    if ('code' in item) return { ...style, face: 'mono', text: item.code };
    if ('status' in item) {
      return { face: 'bold', colour: colours.status[item.status], text: item.status, shape: item.status };
    }
    // A file beside this one: its path is all that paper can say.
    if ('file' in item) return { ...style, text: running ? `${item.text} (${item.file})` : item.text };
    return linkRun(item, style, links, running);
  });
}

export function textRuns(text: string, style: RunStyle = plain): Run[] {
  return [{ ...style, text }];
}
