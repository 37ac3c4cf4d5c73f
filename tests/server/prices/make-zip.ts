import { crc32, deflateRawSync } from 'node:zlib';
import { fromBuffer } from 'yauzl';

export interface ZipPart {
  readonly name: string;
  readonly content: Buffer;
  /** What the archive claims, where it differs from the truth. */
  readonly claims?: { readonly inflatedBytes?: number; readonly isEncrypted?: boolean };
  /** Points at the data of the part before it instead of data of its own. */
  readonly overlaps?: boolean;
}

/** A packed file written byte by byte, so that it can also lie. */
export function makeZip(parts: readonly ZipPart[]): Buffer {
  const local: Buffer[] = [];
  const central: Buffer[] = [];
  let offset = 0;
  let previousOffset = 0;
  let previous: { packed: Buffer; content: Buffer } | null = null;
  for (const part of parts) {
    const name = Buffer.from(part.name);
    const source: { packed: Buffer; content: Buffer } =
      part.overlaps === true && previous !== null
        ? previous
        : { packed: deflateRawSync(part.content), content: part.content };
    const fields = Buffer.alloc(26);
    fields.writeUInt16LE(20, 0);
    fields.writeUInt16LE(part.claims?.isEncrypted === true ? 1 : 0, 2);
    fields.writeUInt16LE(8, 4);
    fields.writeUInt32LE(crc32(source.content), 10);
    fields.writeUInt32LE(source.packed.length, 14);
    fields.writeUInt32LE(part.claims?.inflatedBytes ?? source.content.length, 18);
    fields.writeUInt16LE(name.length, 22);
    const at = source === previous ? previousOffset : offset;
    if (source !== previous) {
      const header = Buffer.concat([Buffer.from('PK\u0003\u0004'), fields, name]);
      local.push(header, source.packed);
      previousOffset = offset;
      offset += header.length + source.packed.length;
    }
    const tail = Buffer.alloc(14);
    tail.writeUInt32LE(at, 10);
    central.push(Buffer.from('PK\u0001\u0002'), Buffer.from([20, 0]), fields, tail, name);
    previous = source;
  }
  const directory = Buffer.concat(central);
  const end = Buffer.alloc(18);
  end.writeUInt16LE(parts.length, 4);
  end.writeUInt16LE(parts.length, 6);
  end.writeUInt32LE(directory.length, 8);
  end.writeUInt32LE(offset, 12);
  return Buffer.concat([...local, directory, Buffer.from('PK\u0005\u0006'), end]);
}

/** The parts of a packed file, to be packed again with a change. */
export function partsOf(bytes: Buffer): Promise<ZipPart[]> {
  return new Promise((resolve, reject) => {
    const parts: ZipPart[] = [];
    fromBuffer(bytes, { lazyEntries: true }, (error, zip) => {
      if (error !== null) {
        reject(error);
        return;
      }
      zip.on('end', () => resolve(parts));
      zip.on('error', reject);
      zip.on('entry', (entry) => {
        zip.openReadStream(entry, (streamError, stream) => {
          if (streamError !== null) {
            reject(streamError);
            return;
          }
          const chunks: Buffer[] = [];
          stream.on('data', (chunk: Buffer) => chunks.push(chunk));
          stream.on('end', () => {
            parts.push({ name: entry.fileName, content: Buffer.concat(chunks) });
            zip.readEntry();
          });
        });
      });
      zip.readEntry();
    });
  });
}
