import { describe, expect, it } from 'vitest';
import { formatProblem } from '../../../src/manifest/problem.js';
import {
  MOST_POINTS,
  readTextureCsv,
  readTextureFile,
  readX3p,
  type TextureFile,
  type TextureFileResult,
} from '../../../src/manifest/texture-files/index.js';
import { readXml } from '../../../src/manifest/texture-files/xml.js';
import { writeZip, type X3pContent, x3pFiles, x3pWith } from './write-x3p.js';

const bytes = (text: string): Uint8Array => new TextEncoder().encode(text);
const fileOf = (result: TextureFileResult): TextureFile => {
  if ('problems' in result) throw new Error(result.problems.map(formatProblem).join('\n'));
  return result.file;
};
const problemOf = (result: TextureFileResult): string => {
  if ('file' in result) throw new Error('read without a problem');
  return result.problems.map(formatProblem).join('\n');
};

/** A made-up map with a tilt, in whole nanometres so that integers hold it, and two points without a height. */
function example(columns = 20, rows = 17): Float64Array {
  const heights = Float64Array.from({ length: columns * rows }, (_, i) => {
    const [x, y] = [i % columns, Math.floor(i / columns)];
    return Math.round(400 * Math.sin(x / 2) * Math.cos(y / 3) + 20 * x) * 1e-9;
  });
  heights[7] = Number.NaN;
  heights[rows * columns - 1] = Number.NaN;
  return heights;
}

describe('heights as separated values', () => {
  const rowsOf = (heights: Float64Array, columns: number, separator = ','): string =>
    Array.from({ length: heights.length / columns }, (_, r) =>
      [...heights.subarray(r * columns, (r + 1) * columns)]
        .map((z) => (Number.isNaN(z) ? '' : String(Number((z * 1e9).toFixed(3)))))
        .join(separator),
    ).join('\n');
  const text = (head: string, body: string): Uint8Array => bytes(`${head}\nheights\n${body}\n`);
  const mapHead =
    'texture,map\nspacing_x,0.5 um\nspacing_y,400 nm\nunit,nm\ninstrument,"invented, confocal"\nnote,made up';

  it('reads back a map', () => {
    const { heights, instrument, note } = fileOf(readTextureCsv('a.csv', text(mapHead, rowsOf(example(), 20))));
    if (heights.kind !== 'map') throw new Error('a map was written');
    const { map } = heights;
    expect([map.columns, map.rows, map.spacingX, map.spacingY]).toEqual([20, 17, 0.5e-6, 400e-9]);
    for (const [i, z] of example().entries())
      if (Number.isNaN(z)) expect(map.heights[i]).toBeNaN();
      else expect(map.heights[i]).toBeCloseTo(z, 15);
    expect(instrument).toBe('invented, confocal');
    expect(note).toBe('made up');
  });

  it.each([';', '\t'])('separator %j, windows line ends, rows filled up by a spreadsheet', (separator) => {
    const head = mapHead.replaceAll('invented, confocal', 'x').replaceAll(',', separator);
    const filled = head.replace('unit', 'unit').replace(/nm$/m, `nm${separator}${separator}`);
    const body = `${filled}\nheights${separator}${separator}\n${rowsOf(example(), 20, separator)}\n`;
    const { heights } = fileOf(readTextureCsv('a.csv', bytes(body.replaceAll('\n', '\r\n'))));
    expect(heights.kind === 'map' && heights.map.heights[3]).toBeCloseTo(example()[3]!, 15);
  });

  it('a profile over any number of lines', () => {
    const body = `1,2,3,4,5,6,7,8,9,10\nnan\n${Array.from({ length: 12 }, (_, i) => i).join('\n')}\n`;
    const { heights } = fileOf(readTextureCsv('p.csv', text('texture,profile\nspacing,0.25 um\nunit,um', body)));
    if (heights.kind !== 'profile') throw new Error('a profile was written');
    expect(heights.profile.spacing).toBe(0.25e-6);
    expect([...heights.profile.heights.subarray(8, 13)]).toEqual([9e-6, 10e-6, Number.NaN, 0, 1e-6]);
  });

  const profileHead = 'texture,profile\nspacing,0.25 um\nunit,um';
  const column = Array.from({ length: 30 }, (_, i) => i / 10).join('\n');
  it.each([
    ['no heights', bytes('texture,profile\nspacing,1 um\n'), /no line "heights"/],
    ['an unknown key', text('texture,profile\nspaicng,1 um', column), /:2:1\n {2}found "spaicng"/],
    ['a key twice', text(`${profileHead}\nunit,nm`, column), /:4:1 {2}unit\n {2}found unit a second time/],
    ['another kind', text('texture,cloud\nspacing,1 um\nunit,um', column), /found "cloud"/],
    ['an unknown unit', text('texture,profile\nspacing,1 um\nunit,furlong', column), /heights are in nm/],
    ['no spacing', text('texture,profile\nunit,um', column), /no line "spacing"/],
    ['a spacing without unit', text('texture,profile\nspacing,0.25\nunit,um', column), /:2:1 {2}spacing_x\n/],
    ['a spacing of a metre', text('texture,profile\nspacing,1 m\nunit,um', column), /1 nm to 1 mm apart/],
    [
      'both kinds of spacing',
      text('texture,map\nspacing,1 um\nspacing_x,1 um\nunit,nm', rowsOf(example(), 20)),
      /together/,
    ],
    ['words among the heights', text(profileHead, `${column}\nhigh`), /:35:1 {2}heights\n {2}found "high"/],
    ['a decimal comma', text(profileHead.replaceAll(',', ';'), `${column}\n0,5`), /decimal comma/],
    ['an infinite height', text(profileHead, `${column}\n1e999`), /finite/],
    ['hexadecimal', text(profileHead, `${column}\n0x10`), /found "0x10"/],
    ['ragged rows', text(mapHead, `${rowsOf(example(), 20)}\n1,2,3`), /found 3 heights; every row of the map has 20/],
    ['too few points', text(profileHead, '1\n2\n3'), /16 points or more/],
    ['mostly holes', text(profileHead, `${column}${'\nnan'.repeat(40)}`), /half of the points/],
    ['the wrong unit', text('texture,profile\nspacing,1 um\nunit,m', column), /Is the unit of the heights right/],
    ['bytes', new Uint8Array([0xff, 0xfe, 0, 1]), /not UTF-8/],
    ['a zero byte', text(profileHead, `${column}\0`), /not UTF-8 text/],
    ['nothing', new Uint8Array(), /no line "heights"/],
  ])('refuses %s', (_, content, message) => {
    expect(problemOf(readTextureCsv('a.csv', content))).toMatch(message);
  });

  it('refuses more points than it holds, and one endless line, without taking them apart', () => {
    const row = `${'1,'.repeat(2 ** 20 - 1)}1\n`;
    expect(problemOf(readTextureCsv('a.csv', text(profileHead, row.repeat(5))))).toMatch(`more than ${MOST_POINTS}`);
    const endless = new Uint8Array(12 * 1024 * 1024).fill(0x2c);
    expect(problemOf(readTextureCsv('a.csv', endless))).toMatch(/a line has at most/);
  });
});

const content = (change: Partial<X3pContent> = {}): X3pContent => ({
  columns: 20,
  rows: 17,
  spacingX: 0.5e-6,
  spacingY: 0.4e-6,
  type: 'D',
  heights: example(),
  ...change,
});
const archive = (c: X3pContent): Uint8Array => writeZip(x3pFiles(c).files, 'a comment');

describe('X3P, ISO 25178-72', () => {
  it.each([
    ['16-bit integers', { type: 'I', increment: 1e-9, offset: 2e-6, validPoints: true }, 15],
    ['32-bit integers', { type: 'L', increment: 1e-12, validPoints: true }, 15],
    ['32-bit floating point', { type: 'F' }, 12],
    ['64-bit floating point', { type: 'D' }, 18],
    ['without checksums', { type: 'D', checksums: false }, 18],
  ] as const)('reads back %s', (_, change, digits) => {
    const c = content(change);
    const { heights, instrument, note } = fileOf(readX3p('a.x3p', archive(c)));
    if (heights.kind !== 'map') throw new Error('a map was written');
    const { map } = heights;
    expect([map.columns, map.rows, map.spacingX, map.spacingY]).toEqual([20, 17, 0.5e-6, 0.4e-6]);
    for (const [i, z] of c.heights.entries())
      if (Number.isNaN(z)) expect(map.heights[i]).toBeNaN();
      else expect(map.heights[i]).toBeCloseTo(z, digits);
    expect(instrument).toBe('Invented & Sons Confocal 1');
    expect(note).toBe('demo <data>');
  });

  it('a profile', () => {
    const c = content({ feature: 'PRF', columns: 340, rows: 1 });
    const { heights } = fileOf(readTextureFile('p', archive(c)));
    expect(heights.kind === 'profile' && heights.profile.spacing).toBe(0.5e-6);
  });

  it('bytes that are no archive are read as text', () => {
    expect(problemOf(readTextureFile('p', bytes('texture,profile\n')))).toMatch(/no line "heights"/);
  });

  it.each([
    ['point clouds', (m: string) => m.replace('>SUR<', '>PCL<'), /found "PCL"/],
    ['several layers', (m: string) => m.replace('<SizeZ>1', '<SizeZ>2'), /several layers/],
    ['no increment', (m: string) => m.replace(/<Increment>5e-7<\/Increment>/, ''), /no Record1.Axes.CX.Increment/],
    ['absolute x', (m: string) => m.replace('<AxisType>I', '<AxisType>A'), /Record1.Axes.CX.AxisType/],
    [
      'another data type',
      (m: string) => m.replace('<AxisType>A</AxisType><DataType>D', '<AxisType>A</AxisType><DataType>Q'),
      /found "Q"/,
    ],
    ['a size that is no number', (m: string) => m.replace('<SizeX>20', '<SizeX>0x14'), /found "0x14"; a number/],
    ['a size of 1e9', (m: string) => m.replace('<SizeX>20', '<SizeX>1e9'), /whole number from 1/],
    ['more points than data', (m: string) => m.replace('<SizeX>20', '<SizeX>21'), /2720 bytes; the points need 2856/],
    ['fewer points than data', (m: string) => m.replace('<SizeX>20', '<SizeX>19'), /at most 2584 bytes/],
    [
      'a link out of the archive',
      (m: string) => m.replace('bindata/data.bin', '../../etc/passwd'),
      /no "..\/..\/etc\/passwd" in the archive/,
    ],
    [
      'lists instead of data',
      (m: string) => m.replace(/<DataLink>.*<\/DataLink>/s, '<DataList/>'),
      /no Record3.DataLink.PointDataLink/,
    ],
    ['an element twice', (m: string) => m.replace('<SizeX>20', '<SizeX>20</SizeX><SizeX>20'), /SizeX 2 times/],
    ['a changed sum of the data', (m: string) => m.replace(/(<MD5ChecksumPointData>)./, '$1x'), /another checksum/],
    ['a document type', (m: string) => m.replace('<p:ISO', '<!DOCTYPE a [<!ENTITY b "c">]><p:ISO'), /document type/],
    ['an entity of its own', (m: string) => m.replace('&amp;', '&b;'), /found "&b;" in line \d+ of main.xml/],
    [
      'tags that cross',
      (m: string) => m.replace('</Instrument></Record2>', '').replace('</SizeX>', '</SizeY>'),
      /close in the order/,
    ],
  ])('refuses %s', (_, change, message) => {
    const changed = x3pWith(content(), change);
    expect(problemOf(readX3p('a.x3p', changed))).toMatch(message);
  });

  const { files } = x3pFiles(content());
  const [main, data] = [files[0]!, files[1]!];
  it.each([
    ['no main.xml', writeZip(files.slice(1)), /no "main.xml" in the archive/],
    [
      'a changed main.xml',
      writeZip([{ ...main, content: bytes(`${x3pFiles(content()).main} `) }, ...files.slice(1)]),
      /another checksum/,
    ],
    ['a file twice', writeZip([...files, data]), /twice in the archive/],
    ['a path upward', writeZip([...files, { ...data, name: 'a/../../b' }]), /stay inside/],
    ['an absolute path', writeZip([...files, { ...data, name: '/b' }]), /stay inside/],
    ['encryption', writeZip([{ ...main, pretend: { flags: 1 } }, ...files.slice(1)]), /encrypted/],
    ['another method', writeZip([{ ...main, pretend: { method: 14 } }, ...files.slice(1)]), /packed by method 14/],
    ['a wrong sum in the archive', writeZip([{ ...main, pretend: { crc: 1 } }, ...files.slice(1)]), /wrong checksum/],
    ['a length that is not kept', writeZip([{ ...main, pretend: { size: 100 } }, ...files.slice(1)]), /length stated/],
    [
      'a long main.xml',
      writeZip([{ ...main, content: new Uint8Array(2 ** 21).fill(32) }, ...files.slice(1)]),
      /at most 1048576 bytes/,
    ],
    ['an archive cut short', writeZip(files).slice(0, -30), /no end of a zip archive/],
    ['an archive with its start gone', writeZip(files).slice(200), /breaks off|no head/],
    ['nothing but the first letters', bytes('PK'), /no end of a zip archive/],
  ])('refuses %s', (_, changed, message) => {
    expect(problemOf(readX3p('a.x3p', changed))).toMatch(message);
  });

  it('does not unpack a bomb: ten megabytes of zeros that claim the length of the data', () => {
    const bomb = { name: 'bindata/data.bin', content: new Uint8Array(10_000_000), pretend: { size: 2720 } };
    expect(problemOf(readX3p('a.x3p', writeZip([main, bomb, ...files.slice(2)])))).toMatch(/length stated/);
  });

  it('any byte changed is read alike or refused, never an error of the program', () => {
    const good = archive(content({ type: 'I', increment: 1e-9, validPoints: true }));
    for (let i = 0; i < good.length; i += 3) {
      const changed = good.slice();
      changed[i]! ^= 0x55;
      const result = readX3p('a.x3p', changed);
      if ('problems' in result) expect(result.problems.length).toBe(1);
      else expect(result.file.heights.kind).toBe('map');
    }
  });
});

describe('strict XML', () => {
  it('knows names, nesting, text, character references', () => {
    const root = readXml('m', bytes('\ufeff<?xml version="1.0"?><a:b x="1"><c>1 &lt; 2 &#x41;&#66;</c><d/>t</a:b>\n'));
    expect(root.name).toBe('b');
    expect(root.children.map((c) => [c.name, c.text])).toEqual([
      ['c', '1 < 2 AB'],
      ['d', ''],
    ]);
    expect(root.text).toBe('t');
  });

  it.each([
    ['<a>', /not closed/],
    ['<a></a><b/>', /second root/],
    ['<a/>x', /text "x"/],
    ['<a b=1/>', /well-formed/],
    ['<a><!-- <b></a>', /not closed/],
    ['<a>&#0;</a>', /entities/],
    ['<a>&#xD800;</a>', /entities/],
    ['<a>&constructor;</a>', /entities/],
    ['<a><?run now?></a>', /processing instruction/],
    ['<a>'.repeat(40), /more than 32/],
    [`<a>${'<b/>'.repeat(10001)}</a>`, /more than 10000/],
    ['', /not closed/],
  ])('refuses %s', (text, message) => {
    expect(() => readXml('m', bytes(text))).toThrow(message);
  });
});
