import { createHash } from 'node:crypto';
import { quoted } from '../../quantity/index.js';
import { TextureFault } from './fault.js';
import {
  MOST_POINTS,
  readGuarded,
  requireHeights,
  requireSize,
  requireSpacing,
  type TextureFile,
  type TextureFileResult,
} from './texture-file.js';
import { elementAt, readXml, type XmlElement } from './xml.js';
import { type ZipEntry, zipContent, zipEntries } from './zip.js';

const MAIN = 'main.xml';
const LARGEST_MAIN = 1024 * 1024;
const LONGEST_TEXT = 400;

/** Data types of an axis: 16 and 32 bit integer, 32 and 64 bit floating point, little-endian. */
const TYPES = {
  I: { bytes: 2, read: (v: DataView, at: number) => v.getInt16(at, true) },
  L: { bytes: 4, read: (v: DataView, at: number) => v.getInt32(at, true) },
  F: { bytes: 4, read: (v: DataView, at: number) => v.getFloat32(at, true) },
  D: { bytes: 8, read: (v: DataView, at: number) => v.getFloat64(at, true) },
} as const;
type DataType = keyof typeof TYPES;

/**
 * A profile or height map in the exchange format of ISO 25178-72 (first ISO 5436-2): a zip with `main.xml` and the heights
 * in a binary file. Axes x and y in even increments, heights absolute, lengths in m. Points that were not measured are NaN,
 * or zeros of the file of valid points. Checksums that the file carries are checked.
 *
 * Not read: lists of heights within `main.xml`, unordered point clouds, several layers.
 */
export function readX3p(path: string, bytes: Uint8Array): TextureFileResult {
  return readGuarded(path, bytes, () => {
    const entries = zipEntries(bytes);
    const content = (name: string, largest: number, place?: string): Uint8Array =>
      zipContent(bytes, entryNamed(entries, name, place), largest);
    const main = content(MAIN, LARGEST_MAIN);
    const root = readXml(MAIN, main);
    const checksum = textAt(root, 'Record4.ChecksumFile');
    if (checksum !== undefined) checkMain(main, content(checksum, 1024, 'Record4.ChecksumFile'));
    return { heights: heightsOf(root, content), ...about(root) };
  });
}

function entryNamed(entries: ReadonlyMap<string, ZipEntry>, name: string, path?: string): ZipEntry {
  const entry = entries.get(name.replace(/^\.?\//, ''));
  if (!entry) throw new TextureFault(`no ${quoted(name)} in the archive`, 'the file it names', path ? { path } : {});
  return entry;
}

const md5 = (bytes: Uint8Array): string => createHash('md5').update(bytes).digest('hex');

function checkMain(main: Uint8Array, file: Uint8Array): void {
  const stated = /^\s*([0-9a-fA-F]{32})\b/.exec(new TextDecoder().decode(file))?.[1];
  const place = { path: 'Record4.ChecksumFile' };
  if (stated === undefined)
    throw new TextureFault('a checksum file without an MD5 sum', '32 hexadecimal digits', place);
  if (stated.toLowerCase() !== md5(main))
    throw new TextureFault(`${MAIN} with another checksum than stated`, 'an unchanged file', place);
}

function textAt(root: XmlElement, path: string): string | undefined {
  const text = elementAt(root, path.split('.'))?.text.trim();
  return text === '' ? undefined : text;
}

function requiredText(root: XmlElement, path: string): string {
  const text = textAt(root, path);
  if (text === undefined) throw new TextureFault(`no ${path}`, `${MAIN} states it`, { path });
  return text;
}

function oneOf<T extends string>(root: XmlElement, path: string, allowed: readonly T[]): T {
  const text = requiredText(root, path);
  const known = allowed.find((a) => a === text);
  if (known === undefined) throw new TextureFault(quoted(text), `read here: ${allowed.join(', ')}`, { path });
  return known;
}

function numberAt(root: XmlElement, path: string, otherwise?: number): number {
  const text = otherwise === undefined ? requiredText(root, path) : textAt(root, path);
  if (text === undefined) return otherwise as number;
  const value = /^[+-]?(?:\d+(?:\.\d*)?|\.\d+)(?:[eE][+-]?\d+)?$/.test(text) ? Number(text) : Number.NaN;
  if (!Number.isFinite(value)) throw new TextureFault(quoted(text), 'a number', { path });
  return value;
}

function countAt(root: XmlElement, path: string): number {
  const value = numberAt(root, path);
  if (!(Number.isInteger(value) && value >= 1 && value <= MOST_POINTS))
    throw new TextureFault(String(value), `a whole number from 1 to ${MOST_POINTS}`, { path });
  return value;
}

type Content = (name: string, largest: number, place?: string) => Uint8Array;

function heightsOf(root: XmlElement, content: Content): TextureFile['heights'] {
  const kind = oneOf(root, 'Record1.FeatureType', ['SUR', 'PRF']) === 'SUR' ? 'map' : 'profile';
  const size = 'Record3.MatrixDimension';
  const columns = countAt(root, `${size}.SizeX`);
  const rows = countAt(root, `${size}.SizeY`);
  if (countAt(root, `${size}.SizeZ`) !== 1)
    throw new TextureFault('several layers', 'one layer of heights', { path: `${size}.SizeZ` });
  if (kind === 'profile' && rows !== 1)
    throw new TextureFault(`${rows} rows of a profile`, 'a profile has one', { path: `${size}.SizeY` });
  requireSize(kind, columns, rows, { path: size });
  const heights = requireHeights(pointData(root, columns * rows, content), { path: 'Record3.DataLink' });
  const spacingX = incrementOf(root, 'CX');
  if (kind === 'profile') return { kind, profile: { spacing: spacingX, heights } };
  return { kind, map: { columns, rows, spacingX, spacingY: incrementOf(root, 'CY'), heights } };
}

function incrementOf(root: XmlElement, axis: 'CX' | 'CY'): number {
  const path = `Record1.Axes.${axis}`;
  oneOf(root, `${path}.AxisType`, ['I']);
  return requireSpacing(numberAt(root, `${path}.Increment`), { path: `${path}.Increment` });
}

function pointData(root: XmlElement, count: number, content: Content): Float64Array {
  const axis = 'Record1.Axes.CZ';
  oneOf(root, `${axis}.AxisType`, ['A']);
  const { bytes, read } = TYPES[oneOf(root, `${axis}.DataType`, Object.keys(TYPES) as DataType[])];
  const increment = numberAt(root, `${axis}.Increment`, 1);
  const offset = numberAt(root, `${axis}.Offset`, 0);
  const data = linked(root, 'PointDataLink', 'MD5ChecksumPointData', count * bytes, content);
  const valid = elementAt(root, ['Record3', 'DataLink', 'ValidPointsLink'])
    ? linked(root, 'ValidPointsLink', 'MD5ChecksumValidPoints', Math.ceil(count / 8), content)
    : undefined;
  const view = new DataView(data.buffer, data.byteOffset, data.byteLength);
  const heights = new Float64Array(count);
  for (let i = 0; i < count; i++) {
    const measured = valid === undefined || ((valid[i >> 3] as number) >> (i & 7)) & 1;
    const value = offset + increment * read(view, i * bytes);
    heights[i] = measured && Number.isFinite(value) ? value : Number.NaN;
  }
  return heights;
}

/** A file of the archive that `main.xml` names, of the exact length that the points need, its checksum checked. */
function linked(root: XmlElement, link: string, checksum: string, length: number, content: Content): Uint8Array {
  const path = `Record3.DataLink.${link}`;
  const data = content(requiredText(root, path), length, path);
  if (data.length !== length) throw new TextureFault(`${data.length} bytes`, `the points need ${length}`, { path });
  const stated = textAt(root, `Record3.DataLink.${checksum}`);
  if (stated !== undefined && stated.toLowerCase() !== md5(data))
    throw new TextureFault('another checksum than stated', 'an unchanged file', { path });
  return data;
}

function about(root: XmlElement): Partial<TextureFile> {
  const parts = ['Manufacturer', 'Model', 'Serial'].map((name) => textAt(root, `Record2.Instrument.${name}`));
  const instrument = parts
    .filter((part) => part !== undefined)
    .join(' ')
    .slice(0, LONGEST_TEXT);
  const note = textAt(root, 'Record2.Comment')?.slice(0, LONGEST_TEXT);
  return { ...(instrument ? { instrument } : {}), ...(note ? { note } : {}) };
}
