/** Snags and cautions in words, each with the sign that stands at its part. */
import type { Notice } from '../../readings/readings.ts';
import { baselineBelowMiddle, wrapped } from '../fontMetrics.ts';
import type { Primitive } from '../primitives.ts';
import { signShapes, type SignKind } from '../shapes/signs.ts';

const size = 13;
const lineHeight = 18;
const indent = 32;

/** @returns the list's primitives and the height it takes. */
export const noticeList = (
  kind: SignKind,
  notices: readonly Notice[],
  left: number,
  top: number,
  width: number,
): { readonly shapes: readonly Primitive[]; readonly height: number } => {
  const shapes: Primitive[] = [];
  let y = top;
  for (const [index, { parts, message }] of notices.entries()) {
    const id = `plate-${kind}${index}`;
    const lines = wrapped(message, width - indent, size);
    const sign = signShapes(kind, index + 1, undefined, [left + 11, y + lineHeight / 2 + 2]);
    shapes.push(
      ...sign.map(
        (shape) => ({ ...shape, id: `plate/${shape.id}`, layer: 'still', thing: 'title' }) as const,
      ),
    );
    const texts = [
      { text: parts.join(', '), weight: 600 } as const,
      ...lines.map((text) => ({ text, weight: 400 }) as const),
    ];
    for (const [line, { text, weight }] of texts.filter(({ text }) => text !== '').entries()) {
      shapes.push({
        kind: 'text',
        id: `${id}/line${line}`,
        layer: 'still',
        thing: 'title',
        text,
        x: left + indent,
        y: y + (line + 0.5) * lineHeight + baselineBelowMiddle(size),
        size,
        weight,
        align: 'left',
        role: 'ink',
      });
    }
    y += Math.max(24, texts.filter(({ text }) => text !== '').length * lineHeight) + 8;
  }
  return { shapes, height: y - top };
};
