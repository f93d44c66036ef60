import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { LARGEST_FILE } from '../../src/manifest/index.js';
import { formatProblem } from '../../src/manifest/problem.js';
import { readYaml } from '../../src/manifest/read-yaml.js';
import { nodeAt, placeOf, toData } from '../../src/manifest/tree.js';

const read = (text: string | Uint8Array) =>
  readYaml('m.yaml', typeof text === 'string' ? new TextEncoder().encode(text) : text);
const tree = (text: string) => {
  const result = read(text);
  if ('problems' in result) throw new Error(result.problems.map(formatProblem).join('\n'));
  return result.root;
};
const problems = (text: string | Uint8Array) => {
  const result = read(text);
  return 'problems' in result ? result.problems : [];
};

describe('readYaml', () => {
  it('keeps the data of the YAML core schema', () => {
    expect(toData(tree('a: 1\nb: yes\nc: 2026-03-02\nd: [x, "1", ~]\ne: {f: 1.50}\n'))).toEqual({
      a: 1,
      b: 'yes',
      c: '2026-03-02',
      d: ['x', '1', null],
      e: { f: 1.5 },
    });
  });

  it('knows the place of every value, counted in characters', () => {
    const root = tree('# é😀\na: {"b": [1, \'😀 x\', z]}\r\nc:\n  - d: "q"\n');
    const at = (...path: (string | number)[]) => {
      const { line, column } = placeOf(nodeAt(root, path)!.mark);
      return [line, column];
    };
    expect(at('a', 'b')).toEqual([2, 10]);
    expect(at('a', 'b', 1)).toEqual([2, 14]);
    expect(at('a', 'b', 2)).toEqual([2, 21]);
    expect(at('c', 0, 'd')).toEqual([4, 8]);
  });

  it('keeps the text of a number as written', () => {
    expect(nodeAt(tree('er: 3.00'), ['er'])).toMatchObject({ value: 3, text: '3.00' });
  });

  it('follows aliases to the place of the anchor', () => {
    const root = tree('a: &t { v: 1 }\nb: *t\n');
    expect(toData(root)).toEqual({ a: { v: 1 }, b: { v: 1 } });
    expect(placeOf(nodeAt(root, ['b', 'v'])!.mark)).toMatchObject({ line: 1, column: 12 });
  });

  it('reports every duplicate key with the line of the first', () => {
    expect(problems('a: 1\nb: {c: 1, c: 2}\na: 2\n')).toMatchObject([
      { line: 2, column: 11, path: 'b.c', found: '"c" a second time' },
      { line: 3, column: 1, path: 'a', allowed: 'a key stands once; the first is in line 1' },
    ]);
  });

  it.each(['__proto__', 'constructor', 'prototype'])('refuses the key %s', (key) => {
    expect(problems(`a:\n  ${key}: { polluted: true }\n`)).toMatchObject([{ line: 2, column: 3, path: `a.${key}` }]);
    expect(({} as Record<string, unknown>).polluted).toBeUndefined();
  });

  it('treats << as an ordinary key', () => {
    expect(toData(tree('a: &x { b: 1 }\nc: { <<: *x }\n'))).toEqual({ a: { b: 1 }, c: { '<<': { b: 1 } } });
  });

  const doubling = (levels: number, times: number) => {
    let text = 'a0: &a0 [x, x, x]\n';
    for (let i = 1; i <= levels; i++) {
      text += `a${i}: &a${i} [${new Array(times).fill(`*a${i - 1}`).join(', ')}]\n`;
    }
    return text;
  };

  it('stops an alias bomb of many aliases with its line', () => {
    expect(problems(doubling(9, 9))).toMatchObject([{ line: 7, found: '81 aliases' }]);
  });

  it('stops an alias bomb of few aliases with its line', () => {
    // 16 levels of 3: 48 aliases, 3^17 values.
    expect(problems(doubling(16, 3))).toMatchObject([{ line: 11, path: 'a10', found: 'aliases that multiply' }]);
  });

  it.each([
    ['a value in itself', 'a: &a { b: *a }', 1],
    ['an alias without anchor', 'a: 1\nb: *x', 2],
    ['an alias before its anchor', 'b: *x\na: &x 1', 1],
    ['an alias as a key', 'a: &x k\n*x : 1', 2],
    ['a list as a key', '? [1, 2]\n: 3', 1],
    ['an unknown tag', 'a: 1\nb: !!js/function "x"', 2],
    ['a tab as indentation', 'a:\n\tb: 1', 2],
    ['an unclosed list', 'a: [1, 2', 1],
    ['deep nesting', '['.repeat(10000), 1],
    ['deep block nesting', Array.from({ length: 200 }, (_, i) => `${' '.repeat(i)}a:`).join('\n'), 24],
    ['several documents', 'a: 1\n---\nb: 2\n', 1],
    ['nothing', '', 1],
    ['only a comment', '# here be nothing\n', 1],
    ['a NUL byte', 'a: 1\nb: x\0y', 2],
  ])('refuses %s', (_name, text, line) => {
    const found = problems(text);
    expect(found).toHaveLength(1);
    expect(found[0]).toMatchObject({ file: 'm.yaml', line });
    expect(found[0]!.found).not.toBe('');
    expect(found[0]!.allowed).not.toBe('');
  });

  it('refuses what is not UTF-8 text', () => {
    const png = new Uint8Array([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]);
    expect(problems(png)).toMatchObject([{ found: 'bytes that are not UTF-8 text' }]);
    expect(problems(new Uint8Array([0x61, 0x3a, 0x20, 0xed, 0xa0, 0x80]))).toHaveLength(1); // an encoded surrogate
  });

  it('refuses a file larger than a manifest can be, and reads one just as large', () => {
    const line = '# filler\n';
    const fits = `a: 1\n${line.repeat(Math.floor((LARGEST_FILE - 5) / line.length))}`;
    expect(problems(fits)).toEqual([]);
    expect(problems(`${fits}${line}`)).toMatchObject([{ found: `${fits.length + line.length} bytes` }]);
  });

  it('ignores a byte order mark', () => {
    expect(toData(tree('\ufeffa: 1\n'))).toEqual({ a: 1 });
  });

  it('ends with a tree or with problems, whatever it is given', () => {
    const token = fc.constantFrom(
      'a',
      ':',
      ' ',
      '\n',
      '- ',
      '&x ',
      '*x',
      '[',
      ']',
      '{',
      '}',
      ',',
      '"',
      "'",
      '|',
      '>',
      '!!str ',
      '? ',
      '#',
      '---\n',
      '\t',
      '%',
      'é',
    );
    fc.assert(
      fc.property(
        fc.oneof(
          fc.string(),
          fc.array(token, { maxLength: 30 }).map((t) => t.join('')),
        ),
        (text) => {
          const result = read(text);
          if ('root' in result) expect(toData(result.root)).toBeDefined();
          else expect(result.problems.length).toBeGreaterThan(0);
        },
      ),
      { seed: 5, numRuns: 1000 },
    );
  });
});
