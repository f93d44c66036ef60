import { describe, expect, it } from 'vitest';
import { readCsv } from '../../src/manifest/read-csv.js';
import { makeSource } from '../../src/manifest/tree.js';
import { csvText } from '../../src/render/csv.js';

const cellsOf = (text: string) => {
  const read = readCsv(makeSource('t.csv', text.slice(1)));
  if ('problems' in read) throw new Error(JSON.stringify(read.problems));
  return read.records.map((record) => record.map((field) => field.text));
};

describe('a table as CSV', () => {
  it('begins with a byte order mark and ends its lines in CRLF', () => {
    expect(
      csvText([
        ['a', 'µm'],
        ['1', '2'],
      ]),
    ).toBe('\ufeffa,µm\r\n1,2\r\n');
  });

  it('is read back by our own reader: commas, quotes, spaces at the ends, empty cells', () => {
    const rows = [
      ['a,b', 'say "x"', ' space ', ''],
      ["it's", ',', '""', 'plain'],
    ];
    expect(cellsOf(csvText(rows))).toEqual(rows);
  });

  it.each(['=1+1', '+1+1', '-1+1', '@SUM(A1)', '\t=1', ' =1', '=cmd|x', '−1+A1', '＝1+1', '=HYPERLINK("x")'])(
    'keeps %j from being a formula',
    (text) => {
      expect(cellsOf(csvText([['x', text]]))[0][1].startsWith("'")).toBe(true);
    },
  );

  it.each(['-5', '+5', '-0.25', '-1e-3', '5', '0.0014', 'a=b', '3 - 2'])('leaves %j as it is', (text) => {
    expect(cellsOf(csvText([['x', text]]))[0][1]).toBe(text);
  });

  it('puts a cell of several lines onto one', () => {
    expect(csvText([['a\r\n=b', 'c\nd']])).toBe('\ufeffa =b,c d\r\n');
  });
});
