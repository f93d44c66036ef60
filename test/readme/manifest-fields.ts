/** The manifest fields as Markdown tables, from the schemas, for the README between its two markers. */
import { readFileSync, writeFileSync } from 'node:fs';
import { manifestSchemas } from '../../src/manifest/index.js';

interface Node {
  readonly description?: string;
  readonly type?: string;
  readonly enum?: readonly unknown[];
  readonly properties?: Readonly<Record<string, Node>>;
  readonly required?: readonly string[];
  readonly items?: Node;
  readonly anyOf?: readonly Node[];
  readonly oneOf?: readonly Node[];
  readonly else?: Node;
}

export const MARKERS = ['<!-- fields: begin -->', '<!-- fields: end -->'] as const;
const ORDER = ['pack', 'review', 'procurement', 'board', 'requirements', 'laminates', 'foils', 'finishes'];
/** Parts that recur are told once. */
const FIGURE_KEYS = ['value', 'spread', 'basis'];
const isFigure = (node: Node): boolean => FIGURE_KEYS.every((key) => node.properties?.[key] !== undefined);
const isTexture = (node: Node): boolean => ['Rq', 'measured'].every((key) => node.properties?.[key] !== undefined);
const isDeclared = (path: string): boolean => path.endsWith('declared[]');

function rows(node: Node, path: string, needed: boolean): string[] {
  const own = path === '' ? [] : [row(path, node, needed)];
  if (isTexture(node) && path !== '') return own;
  if (isFigure(node) || isDeclared(path)) {
    const extra = Object.entries(node.properties ?? {}).filter(([key]) => key === 'kind' || key === 'fitted_on');
    return [...own, ...(isFigure(node) ? extra.flatMap(([key, child]) => rows(child, `${path}.${key}`, false)) : [])];
  }
  const children = Object.entries(node.properties ?? {}).flatMap(([key, child]) =>
    rows(child, path === '' ? key : `${path}.${key}`, node.required?.includes(key) ?? false),
  );
  const items = node.items?.properties || node.items?.anyOf ? rows(node.items, `${path}[]`, true) : [];
  const choices = [...(node.anyOf ?? []), ...(node.oneOf ?? [])]
    .filter((choice) => choice.properties || choice.items)
    .flatMap((choice) => rows(choice, path, needed).slice(1));
  return [...own, ...children, ...items, ...choices];
}

function row(path: string, node: Node, needed: boolean): string {
  const allowed = node.enum ? ` One of ${node.enum.map((value) => `\`${value}\``).join(', ')}.` : '';
  const kind = isFigure(node) ? ' *A figure.*' : isTexture(node) ? ' *A texture.*' : '';
  const text = `${node.description ?? ''}${allowed}${kind}`.replaceAll('|', '\\|');
  return `| \`${path}\` | ${needed ? 'yes' : ''} | ${text} |`;
}

function first(node: Node, fits: (node: Node) => boolean): Node | undefined {
  if (fits(node)) return node;
  for (const child of [...Object.values(node.properties ?? {}), ...(node.items ? [node.items] : [])]) {
    const found = first(child, fits);
    if (found) return found;
  }
  return undefined;
}

const textureRows = (): string[] =>
  rows(first(manifestSchemas()['foils.schema.json'] as Node, isTexture) as Node, '', true);

function figureRows(): string[] {
  const figure = first(manifestSchemas()['finishes.schema.json'] as Node, isFigure);
  return Object.entries(figure?.properties ?? {}).map(([key, child]) =>
    row(key, child, figure?.required?.includes(key) ?? false),
  );
}

export function fieldTables(): string {
  const table = (title: string, body: readonly string[]): string =>
    `### ${title}\n\n| field | must | meaning |\n|---|---|---|\n${[...new Set(body)].join('\n')}\n`;
  const schemas = manifestSchemas();
  return [
    table('A figure, wherever one is due', figureRows()),
    table('A texture of a copper face', textureRows()),
    ...ORDER.map((name) => {
      const schema = schemas[`${name}.schema.json`] as Node;
      return table(`\`${name}\``, rows(schema.else ?? schema, '', true));
    }),
  ].join('\n');
}

/** README with its field tables replaced. */
export function withFields(readme: string): string {
  const [begin, end] = MARKERS.map((marker) => readme.indexOf(marker));
  if (begin < 0 || end < begin) throw new Error('README.md lacks the markers of its field tables');
  return `${readme.slice(0, begin + MARKERS[0].length)}\n\n${fieldTables()}\n${readme.slice(end)}`;
}

if (process.argv[1]?.endsWith('manifest-fields.ts')) {
  const path = new URL('../../README.md', import.meta.url);
  writeFileSync(path, withFields(readFileSync(path, 'utf8')));
}
