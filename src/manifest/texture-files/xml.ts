import { quoted } from '../../quantity/index.js';
import { TextureFault } from './fault.js';

/** An element: local name, elements within, text within with elements left out. Attributes are checked and dropped. */
export interface XmlElement {
  readonly name: string;
  readonly children: readonly XmlElement[];
  readonly text: string;
}

interface Draft {
  readonly name: string;
  readonly qualified: string;
  readonly children: Draft[];
  text: string;
}

const DEEPEST = 32;
const MOST_ELEMENTS = 10_000;
const NAME = '[A-Za-z_][A-Za-z0-9._-]*(?::[A-Za-z_][A-Za-z0-9._-]*)?';
const START = new RegExp(`<(${NAME})((?:\\s+${NAME}\\s*=\\s*(?:"[^"<]*"|'[^'<]*'))*)\\s*(/?)>`, 'y');
const END = new RegExp(`</(${NAME})\\s*>`, 'y');
const ENTITIES: Readonly<Record<string, string>> = { amp: '&', lt: '<', gt: '>', quot: '"', apos: "'" };

/**
 * The elements of an XML 1.0 document in UTF-8. Strict: well-formed or refused. No document type, hence no entities but the
 * five of the standard and no way to reach outside; few and shallow elements.
 *
 * @param where name of the document, for messages
 * @throws TextureFault
 */
export function readXml(where: string, bytes: Uint8Array): XmlElement {
  const text = decoded(where, bytes);
  const fault = (found: string, allowed: string, offset: number): TextureFault =>
    new TextureFault(`${found} in line ${text.slice(0, offset).split('\n').length} of ${where}`, allowed);
  const open: Draft[] = [];
  let root: Draft | undefined;
  let count = 0;
  let at = /^\s*<\?xml\s[^?]*\?>/.exec(text)?.[0].length ?? 0;
  while (at < text.length) {
    if (text[at] !== '<') {
      const next = text.indexOf('<', at);
      const stop = next < 0 ? text.length : next;
      const piece = text.slice(at, stop);
      const holder = open.at(-1);
      if (holder) holder.text += resolved(piece, (found) => fault(found, 'entities are those of XML itself', at));
      else if (piece.trim() !== '') throw fault(`text ${quoted(piece.trim())}`, 'text stands within an element', at);
      at = stop;
      continue;
    }
    const skipped = skip(text, at);
    if (skipped) {
      if (skipped.end < 0) throw fault('a mark that is not closed', 'well-formed XML', at);
      const holder = open.at(-1);
      if (holder) holder.text += skipped.text;
      at = skipped.end;
      continue;
    }
    if (text.startsWith('<!', at) || text.startsWith('<?', at))
      throw fault('a document type or processing instruction', 'elements and text alone', at);
    END.lastIndex = at;
    const end = END.exec(text);
    if (end) {
      if (open.pop()?.qualified !== end[1]) throw fault(`</${end[1]}>`, 'elements close in the order they opened', at);
      at = END.lastIndex;
      continue;
    }
    START.lastIndex = at;
    const start = START.exec(text);
    if (!start) throw fault(quoted(text.slice(at, at + 20)), 'well-formed XML', at);
    count++;
    if (count > MOST_ELEMENTS || open.length >= DEEPEST)
      throw fault(
        `more than ${count > MOST_ELEMENTS ? MOST_ELEMENTS : DEEPEST} elements`,
        'a short and shallow document',
        at,
      );
    const qualified = start[1]!;
    const element: Draft = { name: qualified.replace(/^.*:/, ''), qualified, children: [], text: '' };
    const holder = open.at(-1);
    if (holder) holder.children.push(element);
    else if (root) throw fault(`a second root ${quoted(qualified)}`, 'one root element', at);
    else root = element;
    if (start[3] === '') open.push(element);
    at = START.lastIndex;
  }
  if (!root || open.length > 0) throw fault('an element that is not closed', 'well-formed XML', text.length);
  return root;
}

function decoded(where: string, bytes: Uint8Array): string {
  try {
    // A mark at the start is removed; other encodings than UTF-8 do not get through.
    return new TextDecoder('utf-8', { fatal: true }).decode(bytes);
  } catch {
    throw new TextureFault(`${where} that is not UTF-8`, 'the document is UTF-8 text');
  }
}

/** Comments count for nothing, CDATA for its content. */
function skip(text: string, at: number): { readonly end: number; readonly text: string } | undefined {
  for (const [from, to, kept] of [
    ['<!--', '-->', false],
    ['<![CDATA[', ']]>', true],
  ] as const) {
    if (!text.startsWith(from, at)) continue;
    const stop = text.indexOf(to, at + from.length);
    return { end: stop < 0 ? -1 : stop + to.length, text: kept && stop >= 0 ? text.slice(at + from.length, stop) : '' };
  }
  return undefined;
}

function resolved(text: string, fault: (found: string) => TextureFault): string {
  if (!text.includes('&')) return text;
  return text.replace(/&([^;&\s]{0,12});?/g, (whole, name: string) => {
    const known = whole.endsWith(';') ? ENTITIES[name] : undefined;
    if (known !== undefined && Object.hasOwn(ENTITIES, name)) return known;
    const code = /^#(?:x([0-9a-fA-F]{1,6})|([0-9]{1,7}));$/.exec(whole.slice(1));
    const point = code ? Number.parseInt(code[1] ?? code[2]!, code[1] ? 16 : 10) : -1;
    if (point < 9 || point > 0x10ffff || (point >= 0xd800 && point < 0xe000)) throw fault(quoted(whole));
    return String.fromCodePoint(point);
  });
}

/** The element at a path of local names below another; undefined where there is none, a fault where there are several. */
export function elementAt(root: XmlElement, path: readonly string[]): XmlElement | undefined {
  let element: XmlElement | undefined = root;
  for (const name of path) {
    const found: readonly XmlElement[] = element.children.filter((child) => child.name === name);
    if (found.length > 1)
      throw new TextureFault(`${name} ${found.length} times`, 'it stands once', { path: path.join('.') });
    element = found[0];
    if (!element) return undefined;
  }
  return element;
}
