import { createHash } from 'node:crypto';
import { crc32, deflateRawSync } from 'node:zlib';

export interface ZipFile {
  readonly name: string;
  readonly content: Uint8Array;
  /** Stored when false. */
  readonly deflate?: boolean;
  /** Written into the headers instead of the truth. */
  readonly pretend?: {
    readonly size?: number;
    readonly crc?: number;
    readonly method?: number;
    readonly flags?: number;
  };
}

const bytesOf = (text: string): Uint8Array => new TextEncoder().encode(text);

/** A zip archive, byte by byte as the application note has it. */
export function writeZip(files: readonly ZipFile[], comment = ''): Uint8Array {
  const parts: Buffer[] = [];
  const central: Buffer[] = [];
  let offset = 0;
  for (const { name, content, deflate = true, pretend = {} } of files) {
    const packed = deflate ? deflateRawSync(content) : content;
    const common = Buffer.alloc(26);
    common.writeUInt16LE(20, 0);
    common.writeUInt16LE(pretend.flags ?? 0, 2);
    common.writeUInt16LE(pretend.method ?? (deflate ? 8 : 0), 4);
    common.writeUInt32LE(pretend.crc ?? crc32(content), 10);
    common.writeUInt32LE(packed.length, 14);
    common.writeUInt32LE(pretend.size ?? content.length, 18);
    common.writeUInt16LE(bytesOf(name).length, 22);
    const local = Buffer.concat([Buffer.from('PK\x03\x04', 'latin1'), common, bytesOf(name), packed]);
    const tail = Buffer.alloc(14);
    tail.writeUInt32LE(offset, 10);
    central.push(Buffer.concat([Buffer.from('PK\x01\x02\x14\x00', 'latin1'), common, tail, bytesOf(name)]));
    parts.push(local);
    offset += local.length;
  }
  const directory = Buffer.concat(central);
  const end = Buffer.alloc(22);
  end.write('PK\x05\x06', 0, 'latin1');
  end.writeUInt16LE(files.length, 8);
  end.writeUInt16LE(files.length, 10);
  end.writeUInt32LE(directory.length, 12);
  end.writeUInt32LE(offset, 16);
  end.writeUInt16LE(comment.length, 20);
  return new Uint8Array(Buffer.concat([...parts, directory, end, Buffer.from(comment, 'latin1')]));
}

export interface X3pContent {
  readonly feature?: string;
  readonly columns: number;
  readonly rows: number;
  readonly spacingX: number;
  readonly spacingY: number;
  readonly type: 'I' | 'L' | 'F' | 'D';
  /** Of the axis z. */
  readonly increment?: number;
  readonly offset?: number;
  readonly heights: Float64Array;
  /** Write the points without a height into a file of valid points. */
  readonly validPoints?: boolean;
  readonly checksums?: boolean;
}

const SIZES = { I: 2, L: 4, F: 4, D: 8 };

export function pointBytes({ type, heights, increment = 1, offset = 0 }: X3pContent): Uint8Array {
  const view = new DataView(new ArrayBuffer(heights.length * SIZES[type]));
  for (const [i, z] of heights.entries()) {
    const raw = Number.isNaN(z) && (type === 'I' || type === 'L') ? 0 : (z - offset) / increment;
    if (type === 'I') view.setInt16(2 * i, Math.round(raw), true);
    else if (type === 'L') view.setInt32(4 * i, Math.round(raw), true);
    else if (type === 'F') view.setFloat32(4 * i, raw, true);
    else view.setFloat64(8 * i, raw, true);
  }
  return new Uint8Array(view.buffer);
}

const md5 = (bytes: Uint8Array): string => createHash('md5').update(bytes).digest('hex');

/** The files of an X3P archive as ISO 25178-72 lays them out, invented instrument and all. */
export function x3pFiles(content: X3pContent): { main: string; files: ZipFile[] } {
  const {
    feature = 'SUR',
    columns,
    rows,
    spacingX,
    spacingY,
    type,
    increment,
    offset,
    heights,
    checksums = true,
  } = content;
  const points = pointBytes(content);
  const valid = new Uint8Array(Math.ceil(heights.length / 8));
  for (const [i, z] of heights.entries()) if (!Number.isNaN(z)) valid[i >> 3]! |= 1 << (i & 7);
  const axis = (name: string, kind: string, data: string, step?: number, start?: number) =>
    `<${name}><AxisType>${kind}</AxisType><DataType>${data}</DataType>${step === undefined ? '' : `<Increment>${step}</Increment>`}${start === undefined ? '' : `<Offset>${start}</Offset>`}</${name}>`;
  const main = `<?xml version="1.0" encoding="UTF-8"?>
<p:ISO5436_2 xmlns:p="http://www.opengps.eu/2008/ISO5436_2" xmlns:xsi="http://www.w3.org/2001/XMLSchema-instance">
  <!-- invented data -->
  <Record1><Revision>ISO5436 - 2000</Revision><FeatureType>${feature}</FeatureType>
    <Axes>${axis('CX', 'I', 'D', spacingX, 0)}${axis('CY', 'I', 'D', spacingY, 0)}${axis('CZ', 'A', type, increment, offset)}</Axes></Record1>
  <Record2><Date>2026-03-01T10:00:00Z</Date><Instrument><Manufacturer>Invented &amp; Sons</Manufacturer><Model>Confocal</Model><Serial>1</Serial></Instrument><Comment><![CDATA[demo <data>]]></Comment></Record2>
  <Record3><MatrixDimension><SizeX>${columns}</SizeX><SizeY>${rows}</SizeY><SizeZ>1</SizeZ></MatrixDimension>
    <DataLink><PointDataLink>bindata/data.bin</PointDataLink>${checksums ? `<MD5ChecksumPointData>${md5(points)}</MD5ChecksumPointData>` : ''}${
      content.validPoints ? `<ValidPointsLink>bindata/valid.bin</ValidPointsLink>` : ''
    }</DataLink></Record3>
  <Record4><ChecksumFile>md5checksum.hex</ChecksumFile></Record4>
</p:ISO5436_2>
`;
  return {
    main,
    files: [
      { name: 'main.xml', content: bytesOf(main) },
      { name: 'bindata/data.bin', content: points },
      ...(content.validPoints ? [{ name: 'bindata/valid.bin', content: valid, deflate: false }] : []),
      { name: 'md5checksum.hex', content: bytesOf(`${md5(bytesOf(main))} *main.xml\n`), deflate: false },
    ],
  };
}

/** The same with `main.xml` changed and its checksum written anew. */
export function x3pWith(content: X3pContent, change: (main: string) => string): Uint8Array {
  const { main, files } = x3pFiles(content);
  const changed = change(main);
  return writeZip(
    files.map((file) => {
      if (file.name === 'main.xml') return { ...file, content: bytesOf(changed) };
      if (file.name === 'md5checksum.hex') return { ...file, content: bytesOf(`${md5(bytesOf(changed))} *main.xml\n`) };
      return file;
    }),
  );
}
