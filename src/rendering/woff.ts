import { inflateSync } from 'node:zlib';

const WOFF_SIGNATURE = 0x774f4646;
const TABLE_ENTRY = 20;

interface Table {
  tag: number;
  checksum: number;
  body: Buffer;
}

function readTable(woff: Buffer, at: number): Table {
  const [tag, offset, compressed, length, checksum] = [0, 4, 8, 12, 16].map((step) =>
    woff.readUInt32BE(at + step),
  );
  const stored = woff.subarray(offset, offset + compressed);
  const body = compressed < length ? inflateSync(stored, { maxOutputLength: length }) : stored;
  if (body.length !== length) throw new Error(`expected a font table of ${length} bytes, got ${body.length}`);
  return { tag, checksum, body };
}

/**
 * The sfnt font (TrueType, OpenType) inside a WOFF file: the same tables, each inflated and padded to four bytes.
 * Source: W3C, WOFF File Format 1.0, sections 3 to 5.
 */
export function unpackWoff(woff: Buffer): Buffer {
  if (woff.length < 44 || woff.readUInt32BE(0) !== WOFF_SIGNATURE)
    throw new TypeError('expected a WOFF font');
  const flavour = woff.readUInt32BE(4);
  const count = woff.readUInt16BE(12);
  const tables = Array.from({ length: count }, (_, index) => readTable(woff, 44 + index * TABLE_ENTRY));
  const power = 2 ** Math.floor(Math.log2(count));
  const head = Buffer.alloc(12 + 16 * count);
  head.writeUInt32BE(flavour, 0);
  head.writeUInt16BE(count, 4);
  head.writeUInt16BE(power * 16, 6);
  head.writeUInt16BE(Math.log2(power), 8);
  head.writeUInt16BE((count - power) * 16, 10);
  const parts: Buffer[] = [head];
  let offset = head.length;
  tables.forEach((table, index) => {
    const at = 12 + 16 * index;
    head.writeUInt32BE(table.tag, at);
    head.writeUInt32BE(table.checksum, at + 4);
    head.writeUInt32BE(offset, at + 8);
    head.writeUInt32BE(table.body.length, at + 12);
    const padded = Buffer.alloc(Math.ceil(table.body.length / 4) * 4);
    table.body.copy(padded);
    parts.push(padded);
    offset += padded.length;
  });
  return Buffer.concat(parts);
}
