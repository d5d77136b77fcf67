/**
 * Reads what is wanted of a TrueType file: tables, the widths of characters, the outlines' bytes.
 * By the OpenType specification (ISO/IEC 14496-22), sections cmap, head, hhea, hmtx, loca, maxp.
 */
export interface TrueType {
  readonly bytes: DataView;
  readonly tables: ReadonlyMap<string, { readonly offset: number; readonly length: number }>;
  readonly unitsPerEm: number;
  readonly glyphCount: number;
  /** Glyph of a character; 0 where the font has none. */
  readonly glyphOf: (codePoint: number) => number;
  /** Advance width and left side bearing of a glyph, font units. */
  readonly metricsOf: (glyph: number) => { readonly advance: number; readonly bearing: number };
  /** Where a glyph's outline lies in `glyf`. */
  readonly outlineOf: (glyph: number) => { readonly start: number; readonly end: number };
}

export const readTrueType = (file: Uint8Array): TrueType => {
  const bytes = new DataView(file.buffer, file.byteOffset, file.byteLength);
  const tables = new Map<string, { offset: number; length: number }>();
  for (let index = 0; index < bytes.getUint16(4); index++) {
    const record = 12 + 16 * index;
    const name = String.fromCharCode(...file.subarray(record, record + 4));
    tables.set(name, { offset: bytes.getUint32(record + 8), length: bytes.getUint32(record + 12) });
  }
  const at = (name: string): number => {
    const table = tables.get(name);
    if (table === undefined) throw new Error(`the font has no table ${name}`);
    return table.offset;
  };

  const [head, hhea, hmtx, loca, maxp] = ['head', 'hhea', 'hmtx', 'loca', 'maxp'].map(at) as [
    number,
    number,
    number,
    number,
    number,
  ];
  const longOffsets = bytes.getInt16(head + 50) === 1;
  const fullMetrics = bytes.getUint16(hhea + 34);
  const outline = (glyph: number) =>
    longOffsets ? bytes.getUint32(loca + 4 * glyph) : 2 * bytes.getUint16(loca + 2 * glyph);

  return {
    bytes,
    tables,
    unitsPerEm: bytes.getUint16(head + 18),
    glyphCount: bytes.getUint16(maxp + 4),
    glyphOf: readMap(bytes, at('cmap')),
    metricsOf: (glyph) => {
      const full = Math.min(glyph, fullMetrics - 1);
      const bearing =
        glyph < fullMetrics ? hmtx + 4 * glyph + 2 : hmtx + 4 * fullMetrics + 2 * (glyph - fullMetrics);
      return { advance: bytes.getUint16(hmtx + 4 * full), bearing: bytes.getInt16(bearing) };
    },
    outlineOf: (glyph) => ({ start: outline(glyph), end: outline(glyph + 1) }),
  };
};

/** The map of the basic plane: cmap format 4. */
const readMap = (bytes: DataView, cmap: number): ((codePoint: number) => number) => {
  let map = 0;
  for (let index = 0; index < bytes.getUint16(cmap + 2); index++) {
    const subtable = cmap + bytes.getUint32(cmap + 8 + 8 * index);
    if (bytes.getUint16(subtable) === 4) map = subtable;
  }
  if (map === 0) throw new Error('the font has no character map of format 4');
  const segments = bytes.getUint16(map + 6) / 2;
  const [ends, starts] = [map + 14, map + 16 + 2 * segments];
  const [deltas, ranges] = [starts + 2 * segments, starts + 4 * segments];
  return (codePoint) => {
    for (let segment = 0; segment < segments; segment++) {
      if (codePoint > bytes.getUint16(ends + 2 * segment)) continue;
      const start = bytes.getUint16(starts + 2 * segment);
      if (codePoint < start) return 0;
      const delta = bytes.getUint16(deltas + 2 * segment);
      const range = bytes.getUint16(ranges + 2 * segment);
      if (range === 0) return (codePoint + delta) & 0xffff;
      const glyph = bytes.getUint16(ranges + 2 * segment + range + 2 * (codePoint - start));
      return glyph === 0 ? 0 : (glyph + delta) & 0xffff;
    }
    return 0;
  };
};
