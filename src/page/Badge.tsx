import type { ReactElement } from 'react';
import { badgeClearance, badgeShapes, type BadgeSign } from '../drawing/badge/badge.ts';
import { badgeSize } from '../drawing/badge/curves.ts';
import { toSvg } from '../drawing/svg.ts';
import { themes } from '../drawing/themes.ts';
import { useTheme } from './theme.ts';

/** The badge as the plate draws it, on the ledger's ground. The words beside it say the same. */
export function Badge({ sign }: { readonly sign: BadgeSign }): ReactElement {
  const theme = themes[useTheme()];
  const bounds = { left: 0, top: 0, right: badgeSize.width, bottom: badgeSize.height };
  const primitives = badgeShapes('badge', 'badge', sign, [0, 0], 'panel');
  const picture = toSvg(
    { primitives, bounds, unplaced: [] },
    { ...theme, paper: theme.panel },
    { margin: badgeClearance },
  );
  return <div className="badge" aria-hidden="true" dangerouslySetInnerHTML={{ __html: picture }} />;
}
