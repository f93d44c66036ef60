import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath, pathToFileURL } from 'node:url';

export interface Shown {
  readonly expression: string;
  /** As the page prints it. */
  readonly printed: string;
  /** As the program gives it, with as many decimals. */
  readonly value: string;
}

/** The TypeScript examples of a Markdown page. */
export const examplesOf = (markdown: string): string[] =>
  [...markdown.matchAll(/```ts\n([\s\S]*?)```/g)].map((match) => match[1]!);

const RESULT = /^(\S.*); \/\/ = (.+)$/gm;

/** Runs an example as it stands and gives the value of every line that ends in `// = result`. */
export async function runExample(example: string): Promise<Shown[]> {
  const engine = fileURLToPath(new URL('../../src/index.ts', import.meta.url));
  const lines = [...example.matchAll(RESULT)].map(([, expression, printed]) => ({
    expression: expression!,
    printed: printed!,
  }));
  const body = example.replace(RESULT, 'results.push($1);').replace("'boardcase'", JSON.stringify(engine));
  const folder = mkdtempSync(join(tmpdir(), 'boardcase-readme-'));
  try {
    const file = join(folder, 'example.ts');
    writeFileSync(file, `export const results: unknown[] = [];\n${body}`);
    const { results } = (await import(pathToFileURL(file).href)) as { results: unknown[] };
    return lines.map((line, i) => ({ ...line, value: likePrinted(results[i], line.printed) }));
  } finally {
    rmSync(folder, { recursive: true });
  }
}

function likePrinted(value: unknown, printed: string): string {
  if (Array.isArray(value)) {
    const parts = printed.split(', ');
    return value.map((v, i) => likePrinted(v, parts[i] ?? '')).join(', ');
  }
  return typeof value === 'number' ? value.toFixed(printed.split('.')[1]?.length ?? 0) : String(value);
}
