import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { pathToFileURL } from 'node:url';
import axe from 'axe-core';
import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startServer } from '../../src/cli/preview-server.js';
import type { DocumentPage } from '../../src/dossier/document.js';
import { composePack } from '../../src/dossier/index.js';
import { renderPack } from '../../src/render/html/index.js';
import { pagePath } from '../../src/render/html/paths.js';
import { inputOf, studies } from '../dossier/pack-fixture.js';
import { findBrowser, startBrowser } from './browser.js';

/** Phone, tablet, desk and wall. */
const widths = [320, 768, 1280, 2560] as const;
const schemes = ['light', 'dark'] as const;

const executable = findBrowser();
const document = composePack(inputOf(studies()));
/** The first page of each kind; of dossiers and comparisons those with results on both sides. */
const kinds = [...new Map([...document.pages].reverse().map((page) => [page.kind, page] as const)).values()];

async function objections(page: Page): Promise<readonly string[]> {
  await page.evaluate(axe.source);
  const { violations, passes } = (await page.evaluate('axe.run()')) as axe.AxeResults;
  expect(passes.length).toBeGreaterThan(10);
  return violations.map(({ id, nodes }) => `${id}: ${nodes.map((node) => node.html.slice(0, 120)).join(' | ')}`);
}

if (executable === undefined) {
  console.warn('\n*** NO BROWSER FOUND: tests of the look are left out. Set CHROMIUM to the path of one. ***\n');
  describe('the look of pages', () => {
    it('is left out: no browser is found, and none is demanded', () => {
      expect(process.env.BOARDCASE_REQUIRE_BROWSER).not.toBe('1');
    });
  });
} else {
  describe('every kind of page, as the program composes it', () => {
    let browser: Browser;
    let folder: string;

    beforeAll(async () => {
      folder = mkdtempSync(join(tmpdir(), 'boardcase-look-'));
      for (const [path, text] of await renderPack(document)) {
        mkdirSync(dirname(join(folder, path)), { recursive: true });
        writeFileSync(join(folder, path), text);
      }
      browser = await startBrowser(executable);
    });
    afterAll(async () => {
      await browser?.close();
      rmSync(folder, { recursive: true, force: true });
    });

    const cases = kinds.flatMap((page) => schemes.map((scheme) => [page.kind, scheme, page] as const));
    it('is there to be looked at', () => {
      expect(kinds.map(({ kind }) => kind)).toEqual(expect.arrayContaining(['overview', 'dossier', 'compare']));
    });

    it.each(cases)(
      '%s, %s: nothing to object to for axe from phone to wall, and no wider than the screen',
      async (...args) => {
        const [, colorScheme, page] = args as unknown as readonly [string, 'light' | 'dark', DocumentPage];
        const context = await browser.newContext({ colorScheme, bypassCSP: true });
        const tab = await context.newPage();
        try {
          await tab.goto(pathToFileURL(join(folder, pagePath(page.id))).href);
          for (const width of widths) {
            await tab.setViewportSize({ width, height: 900 });
            expect(await tab.evaluate('document.documentElement.scrollWidth'), `${width}`).toBe(width);
            if (width === 320 || width === 1280) expect(await objections(tab), `${width}`).toEqual([]);
          }
        } finally {
          await context.close();
        }
      },
    );

    it.each(schemes)('the preview around the pages: nothing to object to for axe, %s', async (colorScheme) => {
      const state = {
        standing: 'Not built.',
        problems: 'pack.yaml:1:1',
        failed: true,
        good: 1,
        page: '/site/index.html',
      };
      const server = await startServer(folder, 0, state);
      const context = await browser.newContext({ colorScheme, bypassCSP: true });
      const tab = await context.newPage();
      try {
        await tab.goto(server.address);
        await tab.frameLocator('#pages').locator('h1').waitFor();
        expect(await tab.locator('#problems').textContent()).toBe('pack.yaml:1:1');
        expect(await objections(tab)).toEqual([]);
        // Told of the next good build, the pages are loaded anew and the problems go.
        const loads: string[] = [];
        tab.on('framenavigated', (frame) => loads.push(frame.url()));
        server.tell({ ...state, standing: 'Built.', problems: '', failed: false, good: 2 });
        await tab.locator('#problems').waitFor({ state: 'hidden' });
        await expect.poll(() => loads).toEqual([`${server.address}site/index.html`]);
      } finally {
        await context.close();
        await server.close();
      }
    });
  });
}
