import type { ReactElement } from 'react';
import { badgeShapes } from '../drawing/badge/badge.ts';
import type { BadgeSign } from '../drawing/badge/sign.ts';
import { badgeSize } from '../drawing/badge/curves.ts';
import { SmallPicture } from './SmallPicture.tsx';

/** Room for the frame's pen and for the second frame of a missed duty, pixels. */
const room = 6;
const bounds = {
  left: -room,
  top: -room,
  right: badgeSize.width + room,
  bottom: badgeSize.height + room,
};

export function Badge({ sign }: { readonly sign: BadgeSign }): ReactElement {
  return <SmallPicture primitives={badgeShapes('badge', 'badge', sign, [0, 0], 'panel')} bounds={bounds} />;
}
