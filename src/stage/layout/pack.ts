/** Sets groups that no wire joins side by side, in rows. */
import type { GridBox, GridPoint } from '../routing/grid.ts';
import { spacing } from './spacing.ts';

/** Width at which a new row is begun at the earliest: a sheet at 100 % on a common screen. */
const sheetWidth = 110;
/** Wanted width of the whole for its height. */
const aspect = 1.7;

/** How far each group moves. The first goes to the margin, or below what stands already. */
export const packed = (
  groups: readonly { readonly bounds: GridBox }[],
  standing: GridBox | undefined,
): readonly GridPoint[] => {
  const area = groups.reduce(
    (sum, { bounds }) => sum + widthOf(bounds) * (bounds.bottom - bounds.top + spacing.groups),
    0,
  );
  const limit = Math.max(sheetWidth, Math.sqrt(area * aspect));
  const startX = standing === undefined ? spacing.beside : Math.floor(standing.left);
  let x = startX;
  let y = standing === undefined ? spacing.beside : Math.ceil(standing.bottom) + spacing.groups;
  let rowHeight = 0;
  return groups.map(({ bounds }) => {
    const width = widthOf(bounds);
    if (x > startX && x - startX + width > limit) {
      x = startX;
      y += rowHeight + spacing.groups;
      rowHeight = 0;
    }
    const shift: GridPoint = [Math.ceil(x - bounds.left), Math.ceil(y - bounds.top)];
    x += width + spacing.groups;
    rowHeight = Math.max(rowHeight, Math.ceil(bounds.bottom - bounds.top));
    return shift;
  });
};

const widthOf = ({ left, right }: GridBox): number => Math.ceil(right - left);
