import { crc32, deflateRawSync } from 'node:zlib';

export interface ZipPart {
  name: string;
  content: Buffer | string;
  /** Says that it is encrypted. */
  encrypted?: boolean;
  /** Tells another size than the true one. */
  claimedSize?: number;
}

/** A zip archive by hand (PKWARE's APPNOTE 6.3, sections 4.3.7, 4.3.12 and 4.3.16), so that a test can lie in it. */
export function zipFile(parts: readonly ZipPart[]): Buffer {
  const bodies: Buffer[] = [];
  const directory: Buffer[] = [];
  let offset = 0;
  for (const part of parts) {
    const name = Buffer.from(part.name, 'utf8');
    const content = Buffer.from(part.content);
    const packed = deflateRawSync(content);
    // Version 2.0, flags (bit 11: names in UTF-8; bit 0: encrypted), deflate, no date.
    const shared = Buffer.alloc(26);
    shared.writeUInt16LE(20, 0);
    shared.writeUInt16LE(0x800 | (part.encrypted ? 1 : 0), 2);
    shared.writeUInt16LE(8, 4);
    shared.writeUInt32LE(crc32(content), 10);
    shared.writeUInt32LE(packed.length, 14);
    shared.writeUInt32LE(part.claimedSize ?? content.length, 18);
    shared.writeUInt16LE(name.length, 22);
    bodies.push(Buffer.from('PK\x03\x04', 'latin1'), shared, name, packed);
    const place = Buffer.alloc(14);
    place.writeUInt32LE(offset, 10);
    directory.push(Buffer.from('PK\x01\x02\x14\x00', 'latin1'), shared, place, name);
    offset += 30 + name.length + packed.length;
  }
  const central = Buffer.concat(directory);
  const end = Buffer.alloc(22);
  end.write('PK\x05\x06', 'latin1');
  end.writeUInt16LE(parts.length, 8);
  end.writeUInt16LE(parts.length, 10);
  end.writeUInt32LE(central.length, 12);
  end.writeUInt32LE(offset, 16);
  return Buffer.concat([...bodies, central, end]);
}
