import { createRequire } from 'node:module';
import { Resvg } from '@resvg/resvg-js';
import { fontFamily } from './fontMetrics.ts';
import type { Drawing } from './primitives.ts';
import { toSvg, type SvgOptions } from './svg.ts';
import type { Theme } from './themes.ts';

/** Node only: the page draws on its own canvas. */
const require = createRequire(import.meta.url);
const family = '@expo-google-fonts/source-sans-3';

export type PngScale = 1 | 2 | 4;

/** Rasterises a drawing with the bundled font and no other, so that every machine gives the same picture. */
export const toPng = (
  drawing: Drawing,
  theme: Theme,
  options: Omit<SvgOptions, 'scale' | 'embedFont'> & { readonly scale?: PngScale } = {},
): Uint8Array => {
  const { scale = 1, ...rest } = options;
  const picture = new Resvg(toSvg(drawing, theme, rest), {
    fitTo: { mode: 'zoom', value: scale },
    font: {
      loadSystemFonts: false,
      fontFiles: [
        require.resolve(`${family}/400Regular/SourceSans3_400Regular.ttf`),
        require.resolve(`${family}/600SemiBold/SourceSans3_600SemiBold.ttf`),
      ],
      defaultFontFamily: fontFamily,
      sansSerifFamily: fontFamily,
    },
  });
  return picture.render().asPng();
};
