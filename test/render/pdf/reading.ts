import { getDocument, OPS, VerbosityLevel } from 'pdfjs-dist/legacy/build/pdf.mjs';

/** What a reader makes of a PDF: read back by a library that shares nothing with the writer. */
export interface Role {
  readonly role: string;
  readonly alt?: string;
  readonly bbox?: readonly number[];
  readonly children: readonly Role[];
}
export interface ReadPage {
  /** Text of the structure, in its order. */
  readonly text: string;
  /** Running heads, feet and repeated heads of tables. */
  readonly artifacts: string;
  readonly structure: readonly Role[];
  readonly links: readonly { readonly dest: string; readonly contents: string }[];
  /** Painting operators outside of any mark. */
  readonly untagged: number;
  readonly fonts: readonly string[];
}
export interface ReadPdf {
  readonly pages: readonly ReadPage[];
  readonly outline: readonly { readonly title: string; readonly page: number }[];
  /** Page, counted from 1, of each named place. */
  readonly places: ReadonlyMap<string, number>;
  readonly info: Readonly<Record<string, unknown>>;
  readonly attachments: Readonly<Record<string, { readonly content: Uint8Array; readonly description?: string }>>;
}

interface StructNode {
  readonly type?: string;
  readonly id?: string;
  readonly role?: string;
  readonly alt?: string;
  readonly bbox?: readonly number[];
  readonly children?: readonly StructNode[];
}
const roles = (nodes: readonly StructNode[] | undefined): Role[] =>
  (nodes ?? [])
    .filter((node) => node.role !== undefined)
    .map((node) => ({ role: node.role!, alt: node.alt, bbox: node.bbox, children: roles(node.children) }));

export const flatten = (nodes: readonly Role[]): Role[] => nodes.flatMap((node) => [node, ...flatten(node.children)]);
export const squeeze = (text: string): string => text.replace(/\s+/g, '');

type Loaded = Awaited<ReturnType<typeof getDocument>['promise']>;
type LoadedPage = Awaited<ReturnType<Loaded['getPage']>>;

/** Marked content in the order of the structure. */
const contentIds = (nodes: readonly StructNode[]): string[] =>
  nodes.flatMap((node) => (node.type === 'content' ? [node.id!] : contentIds(node.children ?? [])));

async function readText(
  page: LoadedPage,
  structure: StructNode,
): Promise<{ readonly text: string; readonly artifacts: string }> {
  const content = await page.getTextContent({ includeMarkedContent: true, disableNormalization: true });
  const marks: string[] = [];
  const texts = new Map<string, string>();
  for (const item of content.items) {
    if ('str' in item) {
      const mark = marks.at(-1) ?? 'none';
      texts.set(mark, (texts.get(mark) ?? '') + item.str + (item.hasEOL ? '\n' : ''));
    } else if (item.type === 'endMarkedContent') marks.pop();
    // The package's types leave the tag out.
    else marks.push((item as { tag?: string }).tag === 'Artifact' ? 'artifact' : item.id);
  }
  const text = contentIds([structure]).map((id) => texts.get(id) ?? '');
  return { text: text.join(''), artifacts: texts.get('artifact') ?? '' };
}

async function readOperators(
  page: LoadedPage,
): Promise<{ readonly untagged: number; readonly fonts: readonly string[] }> {
  const { fnArray, argsArray } = await page.getOperatorList();
  const painting = new Set<number>([OPS.showText, OPS.stroke, OPS.fill, OPS.eoFill, OPS.fillStroke, OPS.constructPath]);
  const fonts = new Set<string>();
  let depth = 0;
  let untagged = 0;
  fnArray.forEach((fn, i) => {
    if (fn === OPS.beginMarkedContent || fn === OPS.beginMarkedContentProps) depth += 1;
    else if (fn === OPS.endMarkedContent) depth -= 1;
    else if (painting.has(fn) && depth === 0) untagged += 1;
    if (fn === OPS.setFont) fonts.add((page.commonObjs.get(argsArray[i][0]) as { readonly name: string }).name);
  });
  return { untagged, fonts: [...fonts] };
}

export async function readPdf(bytes: Uint8Array): Promise<ReadPdf> {
  const loading = getDocument({
    data: new Uint8Array(bytes),
    verbosity: VerbosityLevel.ERRORS,
    fontExtraProperties: true,
  });
  const document = await loading.promise;
  try {
    const pageOf = async (dest: unknown): Promise<number> =>
      (await document.getPageIndex((dest as readonly [never])[0])) + 1;
    const pages: ReadPage[] = [];
    for (let number = 1; number <= document.numPages; number += 1) {
      const page = await document.getPage(number);
      const structure = (await page.getStructTree()) as StructNode;
      const annotations = (await page.getAnnotations()) as readonly Record<string, unknown>[];
      pages.push({
        ...(await readText(page, structure)),
        ...(await readOperators(page)),
        structure: roles([structure]),
        links: annotations
          .filter((annotation) => annotation.subtype === 'Link')
          .map((annotation) => ({
            dest: String(annotation.dest),
            contents: String((annotation.contentsObj as { readonly str: string }).str),
          })),
      });
    }
    const outline = await Promise.all(
      ((await document.getOutline()) ?? []).map(async ({ title, dest }) => ({ title, page: await pageOf(dest) })),
    );
    const places = new Map<string, number>();
    for (const [name, dest] of Object.entries((await document.getDestinations()) as Record<string, unknown>)) {
      places.set(name, await pageOf(dest));
    }
    const { info } = await document.getMetadata();
    const attachments = ((await document.getAttachments()) ?? {}) as ReadPdf['attachments'];
    return { pages, outline, places, info: info as Readonly<Record<string, unknown>>, attachments };
  } finally {
    await loading.destroy();
  }
}
