/** Packs font tables as a WOFF file. By the W3C recommendation WOFF File Format 1.0 (2012). */
import { deflateSync } from 'node:zlib';
import type { Tables } from './subsetTables.ts';

const checksum = (bytes: Uint8Array): number => {
  let sum = 0;
  for (let at = 0; at < bytes.length; at++)
    sum = (sum + (bytes[at] ?? 0) * 2 ** (8 * (3 - (at % 4)))) % 2 ** 32;
  return sum;
};

const whole = (length: number): number => Math.ceil(length / 4) * 4;

export const webFont = (tables: Tables): Uint8Array => {
  const entries = [...tables].map(([name, bytes]) => {
    const packed = new Uint8Array(deflateSync(bytes, { level: 9 }));
    return { name, bytes, stored: packed.length < bytes.length ? packed : bytes };
  });
  const directory = 44 + 20 * entries.length;
  const size = entries.reduce((sum, { stored }) => sum + whole(stored.length), directory);
  const file = new Uint8Array(size);
  const view = new DataView(file.buffer);
  view.setUint32(0, 0x774f4646);
  view.setUint32(4, 0x00010000);
  view.setUint32(8, size);
  view.setUint16(12, entries.length);
  view.setUint32(
    16,
    entries.reduce((sum, { bytes }) => sum + whole(bytes.length), 12 + 16 * entries.length),
  );
  let offset = directory;
  for (const [index, { name, bytes, stored }] of entries.entries()) {
    const record = 44 + 20 * index;
    for (let letter = 0; letter < 4; letter++) file[record + letter] = name.charCodeAt(letter);
    for (const [column, value] of [offset, stored.length, bytes.length, checksum(bytes)].entries()) {
      view.setUint32(record + 4 + 4 * column, value);
    }
    file.set(stored, offset);
    offset += whole(stored.length);
  }
  return file;
};
