import { crc32, inflateRawSync } from 'node:zlib';
import { quoted } from '../../quantity/index.js';
import { TextureFault } from './fault.js';

/** One file of a zip archive as its central directory tells of it. */
export interface ZipEntry {
  readonly name: string;
  readonly method: number;
  readonly packedSize: number;
  readonly size: number;
  readonly crc: number;
  /** Of the local header. */
  readonly offset: number;
}

const END_RECORD = 0x06054b50;
const CENTRAL_RECORD = 0x02014b50;
const LOCAL_RECORD = 0x04034b50;
const STORED = 0;
const DEFLATED = 8;
const ENCRYPTED = 1;
const MOST_ENTRIES = 256;

const broken = (what: string): TextureFault => new TextureFault(what, 'a whole zip archive is needed');

/**
 * The files of a zip archive by name (PKWARE application note 6.3.3, as ISO/IEC 21320-1 narrows it: stored or deflated, not
 * encrypted, in one part, below 4 GiB). Nothing is unpacked yet.
 *
 * @throws TextureFault on anything else
 */
export function zipEntries(bytes: Uint8Array): ReadonlyMap<string, ZipEntry> {
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  const end = endRecord(view);
  const count = view.getUint16(end + 10, true);
  if (view.getUint16(end + 4, true) !== 0 || view.getUint16(end + 8, true) !== count)
    throw broken('a part of an archive in several parts');
  if (count > MOST_ENTRIES)
    throw new TextureFault(`${count} files in the archive`, `at most ${MOST_ENTRIES} are looked at`);
  const entries = new Map<string, ZipEntry>();
  let at = view.getUint32(end + 16, true);
  for (let i = 0; i < count; i++) {
    if (at + 46 > end || view.getUint32(at, true) !== CENTRAL_RECORD)
      throw broken('a table of contents that breaks off');
    const [nameLength, extra, comment] = [28, 30, 32].map((k) => view.getUint16(at + k, true)) as [
      number,
      number,
      number,
    ];
    const next = at + 46 + nameLength + extra + comment;
    if (next > end) throw broken('a table of contents that breaks off');
    const name = nameOf(bytes.subarray(at + 46, at + 46 + nameLength));
    if (entries.has(name)) throw new TextureFault(`${quoted(name)} twice in the archive`, 'each file stands once');
    if (view.getUint16(at + 8, true) & ENCRYPTED)
      throw new TextureFault(`${quoted(name)} encrypted`, 'archives are read without a password');
    entries.set(name, {
      name,
      method: view.getUint16(at + 10, true),
      crc: view.getUint32(at + 16, true),
      packedSize: view.getUint32(at + 20, true),
      size: view.getUint32(at + 24, true),
      offset: view.getUint32(at + 42, true),
    });
    at = next;
  }
  return entries;
}

function endRecord(view: DataView): number {
  const lowest = Math.max(0, view.byteLength - 22 - 0xffff);
  for (let at = view.byteLength - 22; at >= lowest; at--)
    if (view.getUint32(at, true) === END_RECORD && at + 22 + view.getUint16(at + 20, true) === view.byteLength)
      return at;
  throw broken('no end of a zip archive');
}

function nameOf(bytes: Uint8Array): string {
  let name: string;
  try {
    name = new TextDecoder('utf-8', { fatal: true }).decode(bytes);
  } catch {
    throw new TextureFault('a file name that is not UTF-8', 'names in the archive are UTF-8');
  }
  // Nothing is written to disk; a name like this shows that the archive was not made by an instrument.
  if (/^[/\\]|^[A-Za-z]:|\\|\0|(^|\/)\.\.(\/|$)/.test(name))
    throw new TextureFault(`the file name ${quoted(name)}`, 'names in the archive are relative and stay inside it');
  return name;
}

/**
 * Content of one file of the archive.
 *
 * @param largest bytes after unpacking; an archive that says more, or unpacks to more than it says, is refused
 * @throws TextureFault on that, on a method other than stored or deflated, and on a wrong checksum
 */
export function zipContent(bytes: Uint8Array, entry: ZipEntry, largest: number): Uint8Array {
  const { name, method, packedSize, size, offset, crc } = entry;
  if (size > largest)
    throw new TextureFault(`${quoted(name)} of ${size} bytes`, `at most ${largest} bytes are unpacked here`);
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  if (offset + 30 > bytes.length || view.getUint32(offset, true) !== LOCAL_RECORD)
    throw broken(`no head of ${quoted(name)}`);
  const start = offset + 30 + view.getUint16(offset + 26, true) + view.getUint16(offset + 28, true);
  if (start + packedSize > bytes.length) throw broken(`${quoted(name)} that breaks off`);
  const content = unpacked(bytes.subarray(start, start + packedSize), name, method, size);
  if (content.length !== size) throw broken(`${quoted(name)} of another length than stated`);
  if (crc32(content) !== crc) throw broken(`${quoted(name)} with a wrong checksum`);
  return content;
}

function unpacked(packed: Uint8Array, name: string, method: number, size: number): Uint8Array {
  if (method === STORED) return packed;
  if (method !== DEFLATED)
    throw new TextureFault(`${quoted(name)} packed by method ${method}`, 'files are stored or deflated');
  try {
    return inflateRawSync(packed, { maxOutputLength: Math.max(1, size) });
  } catch {
    throw broken(`${quoted(name)} that does not unpack to the length stated`);
  }
}
