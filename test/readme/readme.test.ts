import { existsSync, readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { examplesOf, runExample } from './examples.js';
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

  it.each(examplesOf(readme).map((example) => [example.split('\n')[0]!, example]))(
    'engine example prints what the program gives: %s',
    async (_, example) => {
      const shown = await runExample(example);
      expect(shown.length).toBeGreaterThan(1);
      for (const { expression, printed, value } of shown) expect(value, expression).toBe(printed);
    },
  );

  it('names the two commands as package.json has them', () => {
    expect(readme).toContain('npm ci && npm run demo');
    expect(readme).toContain('npm ci && npm test');
  });
});
