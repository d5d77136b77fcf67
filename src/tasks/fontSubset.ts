/**
 * Writes src/drawing/embeddedFontData.ts: the outlines of the characters that plates are written in, to be carried
 * inside an SVG file. Run by hand when the font's package changes: npx tsx src/tasks/fontSubset.ts
 */
import { writeFileSync } from 'node:fs';
import { readFont } from './bundledFont.ts';
import { subsetTables } from './subsetTables.ts';
import { readTrueType } from './trueType.ts';
import { webFont } from './webFont.ts';

const run = (first: number, last: number): number[] =>
  Array.from({ length: last - first + 1 }, (_, index) => first + index);

const signs = Array.from(
  '–—‘’“”…−×÷±·°√≤≥≠≈∞→←ΩΩµμΔλθφ²³₀₁₂ŁłŒœŠšŽžĄąĆćĘęŃńŚśŹźŻżČčĎďĚěŇňŘřŤťŮůŐőŰűĞğİıŞş‰€',
);
const characters = [
  ...new Set([...run(0x20, 0x7e), ...run(0xa0, 0xff), ...signs.map((sign) => sign.codePointAt(0) ?? 0)]),
];

const data = ([400, 600] as const).map((weight) => {
  const font = readTrueType(readFont(weight));
  const file = webFont(subsetTables(font, characters, 'Restpoint Text'));
  return `  ${weight}: '${Buffer.from(file).toString('base64')}',`;
});

writeFileSync(
  new URL('../drawing/embeddedFontData.ts', import.meta.url),
  `/**
 * The bundled font cut down to the characters of a drawing, as WOFF in base 64. Outlines: Copyright 2010-2020 Adobe,
 * SIL Open Font License 1.1. Written by src/tasks/fontSubset.ts; not to be edited.
 */
// prettier-ignore
export const embeddedFontData: Readonly<Record<400 | 600, string>> = {
${data.join('\n')}
};
`,
);
