import { badgeShapes } from '../badge/badge.ts';
import type { BadgePlace } from '../badgeRoom.ts';
import { blockTexts, type TextLine } from '../lettering/textBlock.ts';
import type { Primitive } from '../primitives.ts';
import type { WantedBadge } from '../wanted/wanted.ts';

/** The lines beside a badge: the region's word, the current, and the verdict where it is missed. */
export const badgeLines = (badge: WantedBadge, stale: boolean): readonly TextLine[] => [
  [{ text: badge.words, weight: 600, role: stale ? 'soft' : 'ink', thing: 'word' }],
  ...(badge.current === undefined
    ? []
    : [[{ text: badge.current, weight: 400, role: stale ? 'soft' : 'read', thing: 'figure' }] as const]),
  ...(badge.verdict === 'missed'
    ? [[{ text: 'missed', weight: 600, role: stale ? 'soft' : 'missed', thing: 'verdict' }] as const]
    : []),
];

export const badgeWithWords = (
  badge: WantedBadge,
  { corner, words }: BadgePlace,
  stale: boolean,
): readonly Primitive[] => {
  const { id } = badge;
  return [
    ...badgeShapes(id, badge.part.id, { ...badge.sign, stale }, corner),
    ...blockTexts({ ...words, lines: badgeLines(badge, stale) }, id, badge.part.id, 'readings', stale),
  ];
};
