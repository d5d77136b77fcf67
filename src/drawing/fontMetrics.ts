import type { Box } from '../../symbols/art.ts';
import { fontWidths } from './fontWidths.ts';
import type { TextPrimitive } from './primitives.ts';

/**
 * Text measured by the bundled font's own table of widths, kerning off, as both pens draw it: what is measured here
 * is what stands on the screen and in the file.
 */
export const fontFamily = 'Source Sans 3';

/** For the pens: the family, and what may stand in where it is missing. */
export const fontStack = `'${fontFamily}', sans-serif`;

type Weight = 400 | 600;

/** Heights above and depth below the baseline, em: capitals and figures, tall letters, the tails of letters. */
export const capHeight = 0.66;
export const ascent = 0.74;
export const descent = 0.22;

/** Width of a character that the table lacks, em: that of the widest common letter, so that room is left. */
const unknownWidth = 0.85;

const tables = new Map<Weight, ReadonlyMap<number, number>>();

const tableOf = (weight: Weight): ReadonlyMap<number, number> => {
  const known = tables.get(weight);
  if (known !== undefined) return known;
  const table = new Map<number, number>();
  for (const [first, widths] of fontWidths[weight]) {
    for (const [index, width] of widths.split(' ').entries()) {
      if (width !== '') table.set(first + index, Number(width) / 1000);
    }
  }
  tables.set(weight, table);
  return table;
};

/** Whether the bundled font has every character of a text. */
export const isCovered = (text: string, weight: Weight): boolean =>
  Array.from(text).every((character) => tableOf(weight).has(character.codePointAt(0) ?? 0));

/** Widths already worked out, em. The same few names and figures are measured again and again. */
const measured: Readonly<Record<Weight, Map<string, number>>> = { 400: new Map(), 600: new Map() };
const mostMeasured = 4000;

/** Width of one line of text, pixels. */
export const textWidth = (text: string, size: number, weight: Weight = 400): number => {
  const known = measured[weight].get(text);
  if (known !== undefined) return known * size;
  const table = tableOf(weight);
  let width = 0;
  for (const character of text) width += table.get(character.codePointAt(0) ?? 0) ?? unknownWidth;
  if (measured[weight].size >= mostMeasured) measured[weight].clear();
  measured[weight].set(text, width);
  return width * size;
};

/** The box a text takes, tails and tall letters included. */
export const textBox = (text: Pick<TextPrimitive, 'text' | 'x' | 'y' | 'size' | 'weight' | 'align'>): Box => {
  const width = textWidth(text.text, text.size, text.weight);
  const left = text.align === 'left' ? text.x : text.align === 'right' ? text.x - width : text.x - width / 2;
  return {
    left,
    top: text.y - ascent * text.size,
    right: left + width,
    bottom: text.y + descent * text.size,
  };
};

/** How far below the middle of a line its baseline lies, so that capitals and figures stand centred. */
export const baselineBelowMiddle = (size: number): number => (capHeight * size) / 2;

/** A text cut to a width with an ellipsis; whole where it fits. */
export const fitted = (text: string, room: number, size: number, weight: Weight = 400): string => {
  if (textWidth(text, size, weight) <= room) return text;
  const characters = Array.from(text);
  while (characters.length > 0 && textWidth(`${characters.join('').trimEnd()}…`, size, weight) > room) {
    characters.pop();
  }
  return `${characters.join('').trimEnd()}…`;
};

/** A text broken at its spaces into lines of at most `room` pixels; a single word may be wider. */
export const wrapped = (
  text: string,
  room: number,
  size: number,
  weight: Weight = 400,
): readonly string[] => {
  const lines: string[] = [];
  for (const word of text.split(/ +/)) {
    const last = lines.at(-1);
    const longer = last === undefined ? word : `${last} ${word}`;
    if (last !== undefined && textWidth(longer, size, weight) <= room) lines[lines.length - 1] = longer;
    else lines.push(word);
  }
  return lines;
};

/** Where the line through a struck text runs: left end, right end, height, thickness. */
export const strikeOf = (
  text: Pick<TextPrimitive, 'text' | 'x' | 'y' | 'size' | 'weight' | 'align'>,
): { readonly left: number; readonly right: number; readonly y: number; readonly width: number } => {
  const { left, right } = textBox(text);
  return { left: left - 1, right: right + 1, y: text.y - 0.27 * text.size, width: 1.25 };
};
