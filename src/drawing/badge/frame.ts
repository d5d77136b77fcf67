import type { PathCommand } from '../../../symbols/art.ts';
import type { Verdict } from '../../readings/readings.ts';
import { roundedBox } from '../paths.ts';
import type { Role } from '../primitives.ts';
import { quarterArc } from '../../../symbols/pen.ts';
import { badgeSize } from './curves.ts';

export interface FrameStroke {
  readonly part: 'frame' | 'outer' | 'bar';
  readonly commands: readonly PathCommand[];
  readonly role: Role;
  readonly width: number;
  readonly dash?: readonly number[];
}

const stroke = 1.6;
const radius = 4;
/** The frame's stroke lies inside the badge. */
const inner = {
  left: stroke / 2,
  top: stroke / 2,
  right: badgeSize.width - stroke / 2,
  bottom: badgeSize.height - stroke / 2,
};
/** The second frame of a missed duty stands 3 px outside the badge. */
const outer = { left: -3, top: -3, right: badgeSize.width + 3, bottom: badgeSize.height + 3 };
const broken = [6.2, 4.2];

/** The frame without its lower right corner: 16 of its lower side and 14 of its right side are missing. */
const openFrame = (): readonly PathCommand[] => {
  const { left, top, right, bottom } = inner;
  const cut = radius * (1 - quarterArc);
  return [
    ['M', badgeSize.width - 16, bottom],
    ['L', left + radius, bottom],
    ['C', left + cut, bottom, left, bottom - cut, left, bottom - radius],
    ['L', left, top + radius],
    ['C', left, top + cut, left + cut, top, left + radius, top],
    ['L', right - radius, top],
    ['C', right - cut, top, right, top + cut, right, top + radius],
    ['L', right, badgeSize.height - 14],
  ];
};

/** What the verdict draws round a badge. The lower right corner carries it: closed, open, crossed, absent. */
export const frameStrokes = (verdict: Verdict): readonly FrameStroke[] => {
  switch (verdict) {
    case 'held':
      return [{ part: 'frame', commands: roundedBox(inner, radius), role: 'held', width: stroke }];
    case 'at-risk':
      return [{ part: 'frame', commands: openFrame(), role: 'atRisk', width: stroke }];
    case 'missed':
      return [
        { part: 'frame', commands: roundedBox(inner, radius), role: 'missed', width: stroke, dash: broken },
        {
          part: 'outer',
          commands: roundedBox(outer, radius + 2),
          role: 'missed',
          width: stroke,
          dash: broken,
        },
        {
          part: 'bar',
          commands: [
            ['M', 46.6, 45.8],
            ['L', 66.3, 26.4],
          ],
          role: 'missed',
          width: 2.6,
        },
      ];
    case 'not-checked':
      return [];
  }
};
