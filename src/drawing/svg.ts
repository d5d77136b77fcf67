import type { PathCommand } from '../../symbols/art.ts';
import { embeddedFamily, fontFaceRules } from './embeddedFont.ts';
import { fontStack, isCovered, strikeOf, textWidth } from './fontMetrics.ts';
import type { CirclePrimitive, Drawing, PathPrimitive, Primitive, TextPrimitive } from './primitives.ts';
import { rounded } from './round.ts';
import type { Theme } from './themes.ts';

export interface SvgOptions {
  /** Pixels of paper left round the drawing. */
  readonly margin?: number;
  /** Size of the picture against the drawing: 2 doubles `width` and `height`, not the view box. */
  readonly scale?: number;
  /** What a screen reader says of the picture. */
  readonly title?: string;
  readonly description?: string;
  /** Carries the characters' outlines along, so that the file looks the same where the font is missing. */
  readonly embedFont?: boolean;
}

/** Writes a drawing as a stand-alone SVG document. The same drawing always gives the same text. */
export const toSvg = (drawing: Drawing, theme: Theme, options: SvgOptions = {}): string => {
  const { margin = 24, scale = 1 } = options;
  const { bounds } = drawing;
  const [left, top] = [Math.floor(bounds.left - margin), Math.floor(bounds.top - margin)];
  const width = Math.ceil(bounds.right + margin) - left;
  const height = Math.ceil(bounds.bottom + margin) - top;
  const ids = [
    ...(options.title === undefined ? [] : ['drawing-title']),
    ...(options.description === undefined ? [] : ['drawing-description']),
  ].join(' ');
  const family = options.embedFont === true ? `'${embeddedFamily}', ${fontStack}` : fontStack;
  const lines = [
    `<svg xmlns="http://www.w3.org/2000/svg" width="${rounded(width * scale)}" height="${rounded(height * scale)}"` +
      ` viewBox="${left} ${top} ${width} ${height}" role="img"${ids === '' ? '' : ` aria-labelledby="${ids}"`}>`,
    ...(options.title === undefined ? [] : [`<title id="drawing-title">${escaped(options.title)}</title>`]),
    ...(options.description === undefined
      ? []
      : [`<desc id="drawing-description">${escaped(options.description)}</desc>`]),
    ...(options.embedFont === true ? [`<style>${fontFaceRules()}</style>`] : []),
    `<rect x="${left}" y="${top}" width="${width}" height="${height}" fill="${theme.paper}"/>`,
    `<g fill="none" stroke-linecap="round" stroke-linejoin="round" font-family="${escaped(family)}"` +
      ' style="font-kerning:none;font-variant-ligatures:none">',
    ...drawing.primitives.map((primitive) => element(primitive, theme)),
    '</g>',
    '</svg>',
    '',
  ];
  return lines.join('\n');
};

const element = (primitive: Primitive, theme: Theme): string => {
  switch (primitive.kind) {
    case 'path':
      return pathElement(primitive, theme);
    case 'circle':
      return circleElement(primitive, theme);
    case 'text':
      return textElement(primitive, theme);
  }
};

const paint = ({ fill, stroke, width }: PathPrimitive | CirclePrimitive, theme: Theme): string =>
  (fill === undefined ? '' : ` fill="${theme[fill]}"`) +
  (stroke === undefined ? '' : ` stroke="${theme[stroke]}" stroke-width="${rounded(width)}"`);

const pathElement = (path: PathPrimitive, theme: Theme): string => {
  const dash = path.dash === undefined ? '' : ` stroke-dasharray="${path.dash.map(rounded).join(' ')}"`;
  const opacity = path.opacity === undefined ? '' : ` opacity="${rounded(path.opacity)}"`;
  return `<path d="${pathData(path.commands)}"${paint(path, theme)}${dash}${opacity}/>`;
};

const circleElement = (circle: CirclePrimitive, theme: Theme): string =>
  `<circle cx="${rounded(circle.x)}" cy="${rounded(circle.y)}" r="${rounded(circle.radius)}"${paint(circle, theme)}/>`;

const anchors = { left: 'start', centre: 'middle', right: 'end' } as const;

const textElement = (text: TextPrimitive, theme: Theme): string => {
  const { x, y, size, weight, align } = text;
  // Where a character is not the bundled font's, its width is a guess, and no viewer is held to it.
  const length = isCovered(text.text, weight)
    ? ` textLength="${rounded(textWidth(text.text, size, weight))}" lengthAdjust="spacingAndGlyphs"`
    : '';
  const drawn =
    `<text x="${rounded(x)}" y="${rounded(y)}" font-size="${rounded(size)}" font-weight="${weight}"` +
    `${align === 'left' ? '' : ` text-anchor="${anchors[align]}"`} fill="${theme[text.role]}"${length}>` +
    `${escaped(text.text)}</text>`;
  if (text.struck !== true) return drawn;
  const strike = strikeOf(text);
  return (
    `${drawn}\n<path d="M${rounded(strike.left)} ${rounded(strike.y)}L${rounded(strike.right)} ${rounded(strike.y)}"` +
    ` stroke="${theme[text.role]}" stroke-width="${rounded(strike.width)}"/>`
  );
};

const pathData = (commands: readonly PathCommand[]): string =>
  commands.map(([letter, ...numbers]) => `${letter}${numbers.map(rounded).join(' ')}`).join('');

const entities: Readonly<Record<string, string>> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;' };

/** Characters that XML 1.0 does not allow: controls, and surrogates without their other half. */
const unlawful =
  // eslint-disable-next-line no-control-regex -- these are exactly the characters meant
  /[\u0000-\u0008\u000b\u000c\u000e-\u001f\ufffe\uffff]|[\ud800-\udbff](?![\udc00-\udfff])|(?<![\ud800-\udbff])[\udc00-\udfff]/g;

const escaped = (text: string): string =>
  text.replaceAll(unlawful, '').replaceAll(/[&<>"]/g, (character) => entities[character] ?? character);
