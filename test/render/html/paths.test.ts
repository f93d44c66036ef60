import { describe, expect, it } from 'vitest';
import { checkElementId, pagePath, relativeLink } from '../../../src/render/html/paths.js';

describe('paths of pages', () => {
  it.each([
    ['overview', 'index.html'],
    ['board/qb-1', 'board/qb-1.html'],
    ['requirement/R_gain.2', 'requirement/R_gain.2.html'],
    ['evidence', 'evidence.html'],
  ])('%s', (id, path) => expect(pagePath(id)).toBe(path));

  it.each(['', '.', '..', 'a/..', '/a', 'a/', 'a\\b', 'a b', 'a%2fb', 'a\u0000', 'a..b', '-a', 'a/b/c', 'é'])(
    'refuses %j',
    (id) => expect(() => pagePath(id)).toThrow(/not a safe page id/),
  );

  it.each([
    ['index.html', 'board/a.html', 'board/a.html'],
    ['board/a.html', 'index.html', '../index.html'],
    ['board/a.html', 'board/b.html', 'b.html'],
    ['board/a.html', 'requirement/b.html', '../requirement/b.html'],
    ['index.html', 'style.css', 'style.css'],
  ])('from %s to %s', (from, to, link) => expect(relativeLink(from, to)).toBe(link));

  it('keeps ids that pages derive out of reach', () => {
    expect(checkElementId('fig-1_b')).toBe('fig-1_b');
    for (const id of ['1a', 'a__title', 'a.b', 'a b', '']) expect(() => checkElementId(id)).toThrow(/not a safe/);
  });
});
