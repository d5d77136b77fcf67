/**
 * Writes src/drawing/fontWidths.ts: how wide each character of the bundled font is, so that text can be measured
 * without a screen. Run by hand when the font's package changes: npx tsx src/tasks/fontWidths.ts
 */
import { writeFileSync } from 'node:fs';
import { readFont } from './bundledFont.ts';
import { readTrueType } from './trueType.ts';

/** Latin with its first two extensions, Greek, Cyrillic, punctuation, raised and lowered figures, signs. */
const blocks: readonly (readonly [number, number])[] = [
  [0x20, 0x7e],
  [0xa0, 0x17f],
  [0x370, 0x3ff],
  [0x400, 0x45f],
  [0x2010, 0x2026],
  [0x2030, 0x203a],
  [0x2070, 0x2094],
  [0x20a0, 0x20bf],
  [0x2100, 0x212a],
  [0x2190, 0x2199],
  [0x2200, 0x2265],
];

const rows = ([400, 600] as const).map((weight) => {
  const font = readTrueType(readFont(weight));
  const scale = 1000 / font.unitsPerEm;
  const runs = blocks.map(([first, last]) => {
    const widths: string[] = [];
    for (let codePoint = first; codePoint <= last; codePoint++) {
      const glyph = font.glyphOf(codePoint);
      widths.push(glyph === 0 ? '' : String(Math.round(font.metricsOf(glyph).advance * scale)));
    }
    return `    [0x${first.toString(16)}, '${widths.join(' ')}'],`;
  });
  return `  ${weight}: [\n${runs.join('\n')}\n  ],`;
});

writeFileSync(
  new URL('../drawing/fontWidths.ts', import.meta.url),
  `/**
 * Advance widths of the bundled font (Source Sans 3, regular and semibold), thousandths of an em: runs of characters
 * from the code point given, a blank where the font has no such character.
 * Written by src/tasks/fontWidths.ts from the font's own tables; not to be edited.
 */
export const fontWidths: Readonly<Record<400 | 600, readonly (readonly [number, string])[]>> = {
${rows.join('\n')}
};
`,
);
