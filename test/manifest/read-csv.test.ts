import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { readCsv } from '../../src/manifest/read-csv.js';
import { makeSource, placeOf } from '../../src/manifest/tree.js';

function texts(text: string): string[][] {
  const read = readCsv(makeSource('t.csv', text));
  if ('problems' in read) throw new Error(JSON.stringify(read.problems));
  return read.records.map((record) => record.map((field) => field.text));
}

function problem(text: string) {
  const read = readCsv(makeSource('t.csv', text));
  if ('records' in read) throw new Error('the text was accepted');
  return read.problems[0]!;
}

describe('CSV (RFC 4180)', () => {
  it('reads what the seven rules of section 2 allow', () => {
    expect(texts('aaa,bbb,ccc\r\nzzz,yyy,xxx\r\n')).toEqual([
      ['aaa', 'bbb', 'ccc'],
      ['zzz', 'yyy', 'xxx'],
    ]);
    expect(texts('aaa,bbb,ccc\r\nzzz,yyy,xxx')).toHaveLength(2);
    expect(texts('"aaa","b \r\nbb","ccc"\r\nzzz,yyy,xxx')[0]).toEqual(['aaa', 'b \r\nbb', 'ccc']);
    expect(texts('"aaa","b""bb","c,c"')).toEqual([['aaa', 'b"bb', 'c,c']]);
    // Rule 4: spaces are part of a field.
    expect(texts('a , b')).toEqual([['a ', ' b']]);
  });

  it('takes LF and CR for line ends as well, keeps empty fields and skips empty lines', () => {
    expect(texts('a,b\n\n,\rc,""\n')).toEqual([
      ['a', 'b'],
      ['', ''],
      ['c', ''],
    ]);
  });

  it('reads back whatever is written by the rules', () => {
    const field = fc.string({ unit: fc.constantFrom('a', '"', ',', '\r\n', '\n', ' ', 'é', '😀') });
    const table = fc
      .integer({ min: 2, max: 4 })
      .chain((width) => fc.array(fc.array(field, { minLength: width, maxLength: width }), { minLength: 1 }));
    fc.assert(
      fc.property(table, (rows) => {
        const text = rows.map((row) => row.map((f) => `"${f.replaceAll('"', '""')}"`).join(',')).join('\r\n');
        expect(texts(text)).toEqual(rows);
      }),
    );
  });

  it('knows the place of each field, quoted line ends and wide characters counted', () => {
    const read = readCsv(makeSource('t.csv', '😀,b\n"x\ny",second\n'));
    if ('problems' in read) throw new Error('refused');
    const [[, b], [, second]] = read.records as [[unknown, { mark: never }], [unknown, { mark: never }]];
    expect(placeOf(b.mark)).toMatchObject({ line: 1, column: 3 });
    expect(placeOf(second.mark)).toMatchObject({ line: 3, column: 4 });
  });

  it.each([
    ['', 1, 1, /empty file/],
    ['a,b\nc"d,e', 2, 2, /quote inside/],
    ['a,b\n"c,e', 2, 1, /never closed/],
    ['a,b\n"c"d,e', 2, 4, /"d" after a quoted/],
    ['a,b\nc', 2, 1, /1 fields/],
    ['a,b\nc,d,e', 2, 3, /3 fields/],
  ])('refuses %j at line %d, column %d', (text, line, column, found) => {
    expect(problem(text)).toMatchObject({ line, column });
    expect(problem(text).found).toMatch(found);
  });

  it('bounds the number of fields', () => {
    expect(problem(','.repeat(200_000)).found).toMatch(/more than 100000 fields/);
  });
});
