import { HtmlValidate } from 'html-validate';
import { beforeAll, describe, expect, it } from 'vitest';
import { renderIndex, renderPack } from '../../../src/render/html/index.js';
import { packDocument } from '../fixture-document.js';
import { hostileDocument, hostileText } from '../hostile-document.js';
import { skeleton, tagsOf } from './markup.js';

let plain: Map<string, string>;
let hostile: Map<string, string>;
beforeAll(async () => {
  [plain, hostile] = [await renderPack(packDocument), await renderPack(hostileDocument)];
});

describe('hostile text in every field of a user', () => {
  it('changes no tag and no attribute of any page', () => {
    expect([...hostile.keys()]).toEqual([...plain.keys()]);
    for (const [path, html] of plain) {
      if (path.endsWith('.html')) expect(skeleton(hostile.get(path)!), path).toEqual(skeleton(html));
    }
    expect(hostile.get('style.css')).toBe(plain.get('style.css'));
  });

  it('puts no foreign element into any picture', () => {
    const known = new Set(tagsOf([...plain.values()].join('')).map((tag) => tag.name));
    for (const [path, html] of hostile) {
      if (!path.endsWith('.html')) continue;
      for (const { name, attributes } of tagsOf(html)) {
        expect(known, path).toContain(name);
        expect(
          Object.keys(attributes).filter((key) => key.startsWith('on')),
          path,
        ).toEqual([]);
      }
    }
  });

  it('stands on the page as it was written, without signs that no page can show', () => {
    const html = hostile.get('board/qb-1.html')!;
    expect(html).toContain('&lt;script&gt;globalThis.broken');
    expect(html).toContain('{{x}}');
    expect(html).toContain('\u2028');
    expect(html).not.toContain('\u0000');
    expect(html).not.toContain('\u0007');
    expect(html).not.toMatch(/<script|<img|<!--/);
  });

  it('leaves pages valid', async () => {
    const validator = new HtmlValidate({ extends: ['html-validate:recommended'], rules: { 'long-title': 'off' } });
    for (const path of ['index.html', 'board/qb-1.html', 'requirement/r-gain.html']) {
      const report = await validator.validateString(hostile.get(path)!);
      expect(
        report.results.flatMap((result) => result.messages.map((m) => `${path}: ${m.ruleId}: ${m.message}`)),
      ).toEqual([]);
    }
  });

  it('does the index of packs no harm', () => {
    const entry = {
      packId: 'p',
      revision: 'B',
      date: 'd',
      status: 's',
      summary: 't',
      title: 'u',
      href: 'p/B/index.html',
    };
    const bad = {
      ...entry,
      revision: hostileText,
      date: hostileText,
      status: hostileText,
      summary: hostileText,
      title: hostileText,
    };
    expect(skeleton(renderIndex([bad]))).toEqual(skeleton(renderIndex([entry])));
  });
});
