import type { ReactElement } from 'react';
import type { Drawing, Primitive } from '../drawing/primitives.ts';
import { toSvg } from '../drawing/svg.ts';
import { themes } from '../drawing/themes.ts';
import { useTheme } from './theme.ts';

interface SmallPictureProps {
  readonly primitives: readonly Primitive[];
  readonly bounds: Drawing['bounds'];
}

/** A sign as the plate draws it, on the ledger's ground. It only repeats what the words beside it say. */
export function SmallPicture({ primitives, bounds }: SmallPictureProps): ReactElement {
  const theme = themes[useTheme()];
  const picture = toSvg(
    { primitives, bounds, unplaced: [] },
    { ...theme, paper: theme.panel },
    { margin: 0 },
  );
  return <div className="small-picture" aria-hidden="true" dangerouslySetInnerHTML={{ __html: picture }} />;
}
