import { existsSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath, pathToFileURL } from 'node:url';
import { describe, expect, it } from 'vitest';
import { withFields } from './manifest-fields.js';

const readme = readFileSync(new URL('../../README.md', import.meta.url), 'utf8');

describe('README', () => {
  it('lists the manifest fields as the schemas have them (npx tsx test/readme/manifest-fields.ts writes them)', () => {
    expect(withFields(readme)).toBe(readme);
  });

  it('links only to files that exist', () => {
    const links = [...readme.matchAll(/\]\((?!https?:|#)([^)#]+)/g)].map((match) => match[1]);
    expect(links.length).toBeGreaterThan(0);
    for (const link of links) expect(existsSync(new URL(`../../${link}`, import.meta.url)), link).toBe(true);
  });

  it('shows an engine example that runs', async () => {
    const [, example] = readme.match(/```ts\n([\s\S]*?)```/) ?? [];
    const engine = fileURLToPath(new URL('../../src/index.ts', import.meta.url));
    const folder = mkdtempSync(join(tmpdir(), 'boardcase-readme-'));
    try {
      const file = join(folder, 'example.ts');
      writeFileSync(
        file,
        `${example.replace("'boardcase'", JSON.stringify(engine))}\nexport { reflection, figures, face };\n`,
      );
      const shown = await import(pathToFileURL(file).href);
      expect(Math.hypot(shown.reflection.re, shown.reflection.im)).toBeLessThan(1);
      // Two patches of about 6.5 dBi each in a row.
      expect(10 * Math.log10(shown.figures.directivity)).toBeGreaterThan(8);
      // Gradient model at 1.68 skin depths: 2.59 (independent solution).
      expect(shown.face.lossFactor).toBeCloseTo(2.59, 2);
    } finally {
      rmSync(folder, { recursive: true });
    }
  });

  it('names the two commands as package.json has them', () => {
    expect(readme).toContain('npm ci && npm run demo');
    expect(readme).toContain('npm ci && npm test');
  });
});
