/**
 * A font cut down to a few characters: new glyph numbers, outlines without hinting programs, and the tables that
 * name them. By the OpenType specification (ISO/IEC 14496-22).
 */
import type { TrueType } from './trueType.ts';

export type Tables = ReadonlyMap<string, Uint8Array>;

/** Composite glyph flags. */
const flag = {
  wordArguments: 0x1,
  scale: 0x8,
  more: 0x20,
  twoScales: 0x40,
  fourScales: 0x80,
  program: 0x100,
};

export const subsetTables = (font: TrueType, characters: readonly number[], family: string): Tables => {
  const mapped = characters.filter((codePoint) => font.glyphOf(codePoint) !== 0).sort((a, b) => a - b);
  const glyphs = withComponents(font, [0, ...new Set(mapped.map(font.glyphOf))]);
  const numberOf = new Map(glyphs.map((glyph, index) => [glyph, index]));
  const outlines = glyphs.map((glyph) => padded(outline(font, glyph, numberOf)));
  const offsets = outlines.reduce<number[]>(
    (sums, { length }) => [...sums, (sums.at(-1) ?? 0) + length],
    [0],
  );
  const lastOffset = offsets.at(-1) ?? 0;

  const head = copy(font, 'head');
  head.setUint32(8, 0);
  head.setInt16(50, 1);
  const hhea = copy(font, 'hhea');
  hhea.setUint16(34, glyphs.length);
  const maxp = copy(font, 'maxp');
  maxp.setUint16(4, glyphs.length);
  const hmtx = new DataView(new ArrayBuffer(4 * glyphs.length));
  for (const [index, glyph] of glyphs.entries()) {
    const { advance, bearing } = font.metricsOf(glyph);
    hmtx.setUint16(4 * index, advance);
    hmtx.setInt16(4 * index + 2, bearing);
  }
  const loca = new DataView(new ArrayBuffer(4 * offsets.length));
  for (const [index, offset] of offsets.entries()) loca.setUint32(4 * index, offset);
  const glyf = new Uint8Array(lastOffset);
  for (const [index, bytes] of outlines.entries()) glyf.set(bytes, offsets[index]);
  const post = new DataView(new ArrayBuffer(32));
  post.setUint32(0, 0x00030000);

  const bytesOf = (view: DataView) => new Uint8Array(view.buffer);
  return new Map([
    ['OS/2', bytesOf(copy(font, 'OS/2'))],
    [
      'cmap',
      characterMap(mapped.map((codePoint) => [codePoint, numberOf.get(font.glyphOf(codePoint)) ?? 0])),
    ],
    ['glyf', glyf],
    ['head', bytesOf(head)],
    ['hhea', bytesOf(hhea)],
    ['hmtx', bytesOf(hmtx)],
    ['loca', bytesOf(loca)],
    ['maxp', bytesOf(maxp)],
    ['name', names(family)],
    ['post', bytesOf(post)],
  ]);
};

const copy = (font: TrueType, name: string): DataView => {
  const table = font.tables.get(name);
  if (table === undefined) throw new Error(`the font has no table ${name}`);
  const start = font.bytes.byteOffset + table.offset;
  return new DataView(font.bytes.buffer.slice(start, start + table.length) as ArrayBuffer);
};

const padded = (bytes: Uint8Array): Uint8Array => {
  const whole = new Uint8Array(Math.ceil(bytes.length / 4) * 4);
  whole.set(bytes);
  return whole;
};

const outlineBytes = (font: TrueType, glyph: number): Uint8Array => {
  const glyf = font.tables.get('glyf')?.offset ?? 0;
  const { start, end } = font.outlineOf(glyph);
  const from = font.bytes.byteOffset + glyf;
  return new Uint8Array(font.bytes.buffer.slice(from + start, from + end) as ArrayBuffer);
};

interface Component {
  readonly at: number;
  readonly flags: number;
  readonly glyph: number;
  readonly next: number;
}

const componentsOf = (bytes: Uint8Array): readonly Component[] => {
  const view = new DataView(bytes.buffer);
  if (bytes.length === 0 || view.getInt16(0) >= 0) return [];
  const components: Component[] = [];
  for (let at = 10; ;) {
    const flags = view.getUint16(at);
    const scales = flags & flag.scale ? 2 : flags & flag.twoScales ? 4 : flags & flag.fourScales ? 8 : 0;
    const next = at + 4 + (flags & flag.wordArguments ? 4 : 2) + scales;
    components.push({ at, flags, glyph: view.getUint16(at + 2), next });
    if ((flags & flag.more) === 0) return components;
    at = next;
  }
};

const withComponents = (font: TrueType, wanted: readonly number[]): readonly number[] => {
  const glyphs = [...wanted];
  // The list grows as it is walked: a component may itself be composite.
  for (const whole of glyphs) {
    for (const { glyph } of componentsOf(outlineBytes(font, whole))) {
      if (!glyphs.includes(glyph)) glyphs.push(glyph);
    }
  }
  return glyphs;
};

/** One glyph's outline with its parts renumbered and its hinting program left out. */
const outline = (font: TrueType, glyph: number, numberOf: ReadonlyMap<number, number>): Uint8Array => {
  const bytes = outlineBytes(font, glyph);
  if (bytes.length === 0) return bytes;
  const view = new DataView(bytes.buffer);
  const contours = view.getInt16(0);
  if (contours < 0) {
    const components = componentsOf(bytes);
    for (const { at, flags, glyph: part } of components) {
      view.setUint16(at, flags & ~flag.program);
      view.setUint16(at + 2, numberOf.get(part) ?? 0);
    }
    return bytes.slice(0, components.at(-1)?.next);
  }
  const program = 10 + 2 * contours;
  const rest = bytes.slice(program + 2 + view.getUint16(program));
  const kept = new Uint8Array(program + 2 + rest.length);
  kept.set(bytes.slice(0, program));
  kept.set(rest, program + 2);
  return kept;
};

/** A map of the basic plane, format 4: one segment a run of characters whose glyph numbers run along. */
const characterMap = (pairs: readonly (readonly [number, number])[]): Uint8Array => {
  const segments: { first: number; last: number; delta: number }[] = [];
  for (const [codePoint, glyph] of pairs) {
    const delta = (glyph - codePoint) & 0xffff;
    const current = segments.at(-1);
    if (current?.last === codePoint - 1 && current.delta === delta) {
      current.last = codePoint;
    } else segments.push({ first: codePoint, last: codePoint, delta });
  }
  segments.push({ first: 0xffff, last: 0xffff, delta: 1 });
  const count = segments.length;
  const length = 16 + 8 * count;
  const view = new DataView(new ArrayBuffer(12 + length));
  view.setUint16(2, 1);
  view.setUint16(4, 3);
  view.setUint16(6, 1);
  view.setUint32(8, 12);
  const power = 2 ** Math.floor(Math.log2(count));
  for (const [index, value] of [
    4,
    length,
    0,
    2 * count,
    2 * power,
    Math.log2(power),
    2 * (count - power),
  ].entries()) {
    view.setUint16(12 + 2 * index, value);
  }
  for (const [index, { first, last, delta }] of segments.entries()) {
    view.setUint16(26 + 2 * index, last);
    view.setUint16(28 + 2 * count + 2 * index, first);
    view.setUint16(28 + 4 * count + 2 * index, delta);
  }
  return new Uint8Array(view.buffer);
};

/** Whose work the outlines are, and under what licence, stays with them; the cut-down font has its own name. */
const names = (family: string): Uint8Array => {
  const records: readonly (readonly [number, string])[] = [
    [0, 'Copyright 2010-2020 Adobe (http://www.adobe.com/). Cut down to the characters of a drawing.'],
    [1, family],
    [4, family],
    [6, family.replaceAll(' ', '')],
    [13, 'SIL Open Font License, Version 1.1'],
    [14, 'https://openfontlicense.org'],
  ];
  const start = 6 + 12 * records.length;
  const size = records.reduce((sum, [, text]) => sum + 2 * text.length, start);
  const view = new DataView(new ArrayBuffer(size));
  view.setUint16(2, records.length);
  view.setUint16(4, start);
  let offset = 0;
  for (const [index, [id, text]] of records.entries()) {
    for (const [column, value] of [3, 1, 0x409, id, 2 * text.length, offset].entries()) {
      view.setUint16(6 + 12 * index + 2 * column, value);
    }
    for (const character of text) {
      view.setUint16(start + offset, character.charCodeAt(0));
      offset += 2;
    }
  }
  return new Uint8Array(view.buffer);
};
