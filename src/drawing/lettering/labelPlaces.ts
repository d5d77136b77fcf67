/** Where a part's name and value may stand, best place first. */
import type { Box } from '../../../symbols/art.ts';
import { middle } from '../boxes.ts';
import type { ScenePart } from '../scene.ts';
import { facingOf } from './facing.ts';
import { blockHeight, lineHeight, type TextBlock, type TextLine, type TextRun } from './textBlock.ts';

const size = 13;
/** From a part's axis to its name, at least; and from the body's edge. */
const fromAxis = 15;
const fromBody = 8;
/** From the body of a lying part, or the bar of a rail, to the nearest line's middle. */
const overBody = 11;

const nameRun = (text: string): TextRun => ({ text, weight: 600, role: 'ink', thing: 'name' });
const valueRun = (text: string): TextRun => ({ text, weight: 400, role: 'ink', thing: 'value' });

/** Steps by which a place is shifted along the part when the first one is taken. */
const shifts = [0, -6, 6, -12, 12, -18, 18, -24, 24, -30, 30];

export const labelPlaces = (part: ScenePart): readonly TextBlock[] => {
  const runs = [...(part.label === undefined ? [] : [nameRun(part.label)]), ...part.lines.map(valueRun)];
  if (runs.length === 0) return [];
  if (part.joins === 'label') return [tagLabel(part)];
  const facing = facingOf(part);
  const stacked = runs.map((run): TextLine => [run]);
  const { body, origin } = part;
  switch (facing.form) {
    case 'upright':
      return [...beside(stacked, body, origin), ...beside([runs], body, origin), ...ends(stacked, body)];
    case 'lying':
      return [...across([runs], body), ...across(stacked, body), ...ends([runs], body)];
    case 'single':
      return single(facing.side, runs, body);
    case 'transistor':
      return transistor(facing.away, runs, body, origin);
    case 'block':
      return block(runs, body, origin);
  }
};

/** A tag carries its label inside. */
const tagLabel = (part: ScenePart): TextBlock => {
  const [label = part.label ?? ''] = part.lines;
  const pin = part.pins.get('node') ?? part.origin;
  const [x, y] = middle(part.body);
  // The outline is longer than the label on the pointed side.
  const towards = (from: number, to: number) => (from === to ? 0 : Math.sign(to - from) * 5);
  const isLevel = part.stance.turn === 0 || part.stance.turn === 180;
  return {
    lines: [[nameRun(label)]],
    at: isLevel ? [x + towards(pin[0], x), y] : [x, y + towards(pin[1], y)],
    align: 'centre',
    size,
  };
};

type Lines = readonly TextLine[];

const beside = (lines: Lines, body: Box, [x, y]: readonly [number, number]): readonly TextBlock[] => {
  const right = Math.max(x + fromAxis, body.right + fromBody);
  const left = Math.min(x - fromAxis, body.left - fromBody);
  return shifts.flatMap((shift): TextBlock[] => [
    { lines, at: [right, y + shift], align: 'left', size },
    { lines, at: [left, y + shift], align: 'right', size },
  ]);
};

const across = (lines: Lines, body: Box): readonly TextBlock[] => {
  const half = ((lines.length - 1) * lineHeight) / 2;
  const [x] = middle(body);
  return shifts.flatMap((shift): TextBlock[] => [
    { lines, at: [x + shift, body.top - overBody - half], align: 'centre', size },
    { lines, at: [x + shift, body.bottom + overBody + half], align: 'centre', size },
  ]);
};

/** At the corners of the body, for want of anything nearer. */
const ends = (lines: Lines, body: Box): readonly TextBlock[] => {
  const half = blockHeight(lines.length, size) / 2 + 4;
  return [body.top - half, body.bottom + half].flatMap((y): TextBlock[] => [
    { lines, at: [body.right + fromBody, y], align: 'left', size },
    { lines, at: [body.left - fromBody, y], align: 'right', size },
  ]);
};

const single = (side: 'up' | 'down' | 'left' | 'right', runs: TextLine, body: Box): readonly TextBlock[] => {
  const [x, y] = middle(body);
  const level = side === 'up' ? body.top - overBody - 1 : body.bottom + overBody + 1;
  const centred = shifts.map((shift): TextBlock => ({
    lines: [runs],
    at: [x + shift, level],
    align: 'centre',
    size,
  }));
  const right: TextBlock = { lines: [runs], at: [body.right + fromBody, y], align: 'left', size };
  const left: TextBlock = { lines: [runs], at: [body.left - fromBody, y], align: 'right', size };
  const stackedOver: TextBlock = {
    lines: runs.map((run) => [run]),
    at: [x, level + ((side === 'up' ? -1 : 1) * ((runs.length - 1) * lineHeight)) / 2],
    align: 'centre',
    size,
  };
  switch (side) {
    case 'up':
    case 'down':
      return [...centred, stackedOver, right, left];
    case 'right':
      return [right, ...centred];
    case 'left':
      return [left, ...centred];
  }
};

/** A transistor's name stands over the place of its badge. */
const transistor = (
  away: 'left' | 'right' | 'up' | 'down',
  runs: TextLine,
  body: Box,
  [x, y]: readonly [number, number],
): readonly TextBlock[] => {
  const lines = [runs];
  const right = (level: number): TextBlock => ({
    lines,
    at: [body.right + fromAxis, level],
    align: 'left',
    size,
  });
  const left = (level: number): TextBlock => ({
    lines,
    at: [body.left - fromAxis, level],
    align: 'right',
    size,
  });
  const levels = [-31, -43, -55, -22, 31, 43, 22].map((offset) => y + offset);
  const over = [body.top - overBody, body.bottom + overBody].flatMap((level): TextBlock[] =>
    shifts.map((shift) => ({ lines, at: [x + shift, level], align: 'centre', size })),
  );
  switch (away) {
    case 'right':
      return [...levels.map(right), ...levels.map(left), ...over];
    case 'left':
      return [...levels.map(left), ...levels.map(right), ...over];
    case 'up':
    case 'down':
      return [...(away === 'up' ? over : [...over].reverse()), ...levels.map(right), ...levels.map(left)];
  }
};

/** Amplifiers and the like: over the upper right of the body, clear of a supply lead in its middle. */
const block = (runs: TextLine, body: Box, origin: readonly [number, number]): readonly TextBlock[] => {
  const [x] = middle(body);
  const over = body.top - overBody;
  const under = body.bottom + overBody;
  return [
    { lines: [runs], at: [x + 6, over], align: 'left', size },
    { lines: [runs], at: [x + 6, under], align: 'left', size },
    { lines: [runs], at: [x - 6, over], align: 'right', size },
    { lines: [runs], at: [x - 6, under], align: 'right', size },
    ...beside([runs], body, origin),
    ...across([runs], body),
  ];
};
