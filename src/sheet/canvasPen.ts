/**
 * The screen's pen: draws the primitives of `drawing/` on a canvas. The SVG writer draws the same primitives in a
 * file; an end-to-end test holds the two against each other pixel by pixel.
 */
import type { PathCommand } from '../../symbols/art.ts';
import { fontStack, strikeOf } from '../drawing/fontMetrics.ts';
import type { CirclePrimitive, PathPrimitive, Primitive, TextPrimitive } from '../drawing/primitives.ts';
import type { Theme } from '../drawing/themes.ts';

/** What of a 2-D context the pen needs: a canvas has it, and so has a recorder in a test. */
export type PenContext = Pick<
  CanvasRenderingContext2D,
  | 'beginPath'
  | 'moveTo'
  | 'lineTo'
  | 'bezierCurveTo'
  | 'closePath'
  | 'arc'
  | 'fill'
  | 'stroke'
  | 'fillText'
  | 'setLineDash'
  | 'strokeStyle'
  | 'fillStyle'
  | 'lineWidth'
  | 'lineCap'
  | 'lineJoin'
  | 'font'
  | 'fontKerning'
  | 'textAlign'
  | 'textBaseline'
  | 'globalAlpha'
>;

const noDash: number[] = [];
const alignments = { left: 'left', centre: 'center', right: 'right' } as const;

/** Draws in order, first at the bottom. The context's transform is the caller's. */
export function drawPrimitives(context: PenContext, primitives: readonly Primitive[], theme: Theme): void {
  context.lineCap = 'round';
  context.lineJoin = 'round';
  context.textBaseline = 'alphabetic';
  context.fontKerning = 'none';
  for (const primitive of primitives) drawPrimitive(context, primitive, theme);
}

function drawPrimitive(context: PenContext, primitive: Primitive, theme: Theme): void {
  switch (primitive.kind) {
    case 'path':
      drawPath(context, primitive, theme);
      return;
    case 'circle':
      drawCircle(context, primitive, theme);
      return;
    case 'text':
      drawText(context, primitive, theme);
  }
}

function drawPath(context: PenContext, path: PathPrimitive, theme: Theme): void {
  const faint = path.opacity !== undefined;
  if (faint) context.globalAlpha = path.opacity;
  context.beginPath();
  for (const command of path.commands) trace(context, command);
  if (path.fill !== undefined) {
    context.fillStyle = theme[path.fill];
    context.fill();
  }
  if (path.stroke !== undefined) {
    context.strokeStyle = theme[path.stroke];
    context.lineWidth = path.width;
    if (path.dash !== undefined) context.setLineDash([...path.dash]);
    context.stroke();
    if (path.dash !== undefined) context.setLineDash(noDash);
  }
  if (faint) context.globalAlpha = 1;
}

function trace(context: PenContext, command: PathCommand): void {
  switch (command[0]) {
    case 'M':
      context.moveTo(command[1], command[2]);
      return;
    case 'L':
      context.lineTo(command[1], command[2]);
      return;
    case 'C':
      context.bezierCurveTo(command[1], command[2], command[3], command[4], command[5], command[6]);
      return;
    case 'Z':
      context.closePath();
  }
}

function drawCircle(context: PenContext, circle: CirclePrimitive, theme: Theme): void {
  context.beginPath();
  context.arc(circle.x, circle.y, circle.radius, 0, 2 * Math.PI);
  if (circle.fill !== undefined) {
    context.fillStyle = theme[circle.fill];
    context.fill();
  }
  if (circle.stroke !== undefined) {
    context.strokeStyle = theme[circle.stroke];
    context.lineWidth = circle.width;
    context.stroke();
  }
}

function drawText(context: PenContext, text: TextPrimitive, theme: Theme): void {
  context.font = `${text.weight} ${text.size}px ${fontStack}`;
  context.textAlign = alignments[text.align];
  context.fillStyle = theme[text.role];
  context.fillText(text.text, text.x, text.y);
  if (text.struck !== true) return;
  const strike = strikeOf(text);
  context.beginPath();
  context.moveTo(strike.left, strike.y);
  context.lineTo(strike.right, strike.y);
  context.strokeStyle = theme[text.role];
  context.lineWidth = strike.width;
  context.stroke();
}
