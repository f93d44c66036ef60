/**
 * The objects of a PDF file as they stand in it (ISO 32000-1, 7.3). For files of which only the streams are packed, as
 * the ones here.
 */
export class Name {
  constructor(readonly name: string) {}
}
export class Ref {
  constructor(readonly id: number) {}
}
export type Dict = { readonly [key: string]: Value };
export type Value = null | boolean | number | string | Name | Ref | readonly Value[] | Dict;

const token =
  /\s*(?:(<<)|(>>)|(\[)|(\])|\/([^\s<>[\]()/%]*)|\(((?:[^\\()]|\\[\s\S])*)\)|<([0-9A-Fa-f\s]*)>|(\d+) \d+ R|([+-]?\d*\.?\d+)|(true|false|null))/y;

/** Reads one value from the text; the escapes of strings are taken off, and UTF-16 is turned into text. */
function parse(text: string, start: number): { readonly value: Value; readonly end: number } {
  let at = start;
  const next = (): RegExpExecArray => {
    token.lastIndex = at;
    const match = token.exec(text);
    if (match === null) throw new Error(`not a PDF value: ${JSON.stringify(text.slice(at, at + 60))}`);
    at = token.lastIndex;
    return match;
  };
  const closed = Symbol('closed');
  const read = (): Value | typeof closed => {
    const [, open, shut, list, listEnd, name, string, hex, ref, number, word] = next();
    if (open !== undefined) {
      const dict: Record<string, Value> = {};
      for (let key = read(); key !== closed; key = read()) {
        if (!(key instanceof Name)) throw new Error('a key that is no name');
        const value = read();
        if (value === closed) throw new Error(`no value of ${key.name}`);
        dict[key.name] = value;
      }
      return dict;
    }
    if (list !== undefined) {
      const values: Value[] = [];
      for (let value = read(); value !== closed; value = read()) values.push(value);
      return values;
    }
    if (shut !== undefined || listEnd !== undefined) return closed;
    if (name !== undefined)
      return new Name(name.replace(/#(..)/g, (_, code) => String.fromCharCode(parseInt(code, 16))));
    if (string !== undefined) return decode(string);
    if (hex !== undefined) return Buffer.from(hex.replace(/\s/g, ''), 'hex').toString('latin1');
    if (ref !== undefined) return new Ref(Number(ref));
    if (number !== undefined) return Number(number);
    return word === 'null' ? null : word === 'true';
  };
  const value = read();
  if (value === closed) throw new Error('nothing opened');
  return { value, end: at };
}

const escapes: Readonly<Record<string, string>> = { n: '\n', r: '\r', t: '\t', b: '\b', f: '\f' };
function decode(string: string): string {
  const bytes = string.replace(/\\([\s\S])/g, (_, sign) => escapes[sign] ?? sign);
  return bytes.startsWith('\u00FE\u00FF') ? Buffer.from(bytes.slice(2), 'latin1').swap16().toString('utf16le') : bytes;
}

export interface PdfObjects {
  readonly get: (value: Value | undefined) => Value | undefined;
  readonly dict: (value: Value | undefined) => Dict;
  readonly list: (value: Value | undefined) => readonly Value[];
  readonly catalog: Dict;
  /** Every dictionary that is an object of its own. */
  readonly dicts: readonly Dict[];
  /** Bytes of the stream of an object, unpacked. */
  readonly stream: (value: Value | undefined) => Buffer;
}

export function pdfObjects(bytes: Uint8Array, inflate: (data: Buffer) => Buffer): PdfObjects {
  const text = Buffer.from(bytes).toString('latin1');
  const objects = new Map<number, { readonly value: Value; readonly end: number }>();
  const xref = text.lastIndexOf('\nxref\n');
  for (const entry of text.slice(xref).matchAll(/^(\d{10}) 00000 n $/gm)) {
    const offset = Number(entry[1]);
    const head = /^(\d+) 0 obj\n/.exec(text.slice(offset, offset + 20))!;
    objects.set(Number(head[1]), parse(text, offset + head[0].length));
  }
  const get = (value: Value | undefined): Value | undefined =>
    value instanceof Ref ? objects.get(value.id)?.value : value;
  const dict = (value: Value | undefined): Dict => get(value) as Dict;
  const trailer = parse(text, text.lastIndexOf('\ntrailer\n') + 9).value as Dict;
  return {
    get,
    dict,
    list: (value) => (get(value) ?? []) as readonly Value[],
    catalog: dict(trailer.Root),
    dicts: [...objects.values()].map(({ value }) => value).filter(isDict),
    stream: (value) => {
      const { value: head, end } = objects.get((value as Ref).id)!;
      const start = end + text.slice(end).indexOf('stream\n') + 7;
      const data = Buffer.from(bytes).subarray(start, start + Number((head as Dict).Length));
      return (head as Dict).Filter === undefined ? data : inflate(data);
    },
  };
}

const isDict = (value: Value): value is Dict =>
  typeof value === 'object' &&
  value !== null &&
  !(value instanceof Name) &&
  !(value instanceof Ref) &&
  !Array.isArray(value);
export const nameOf = (value: Value | undefined): string | undefined =>
  value instanceof Name ? value.name : undefined;
