import { embeddedFontData } from './embeddedFontData.ts';

/** Name under which a file carries the font along, so that it never stands for an installed one. */
export const embeddedFamily = 'Restpoint Text';

/** Style rules that give an SVG file its own copy of the font. */
export const fontFaceRules = (): string =>
  ([400, 600] as const)
    .map(
      (weight) =>
        `@font-face{font-family:'${embeddedFamily}';font-weight:${weight};` +
        `src:url(data:font/woff;base64,${embeddedFontData[weight]}) format('woff')}`,
    )
    .join('');
