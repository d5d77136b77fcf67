import { blockTexts } from '../lettering/textBlock.ts';
import { polyline } from '../paths.ts';
import { chevron, type ChevronPlace } from '../places/chevronPlaces.ts';
import type { Point } from '../boxes.ts';
import type { Primitive } from '../primitives.ts';
import type { WantedCurrent } from '../wanted/wanted.ts';

/** An open chevron in the lead, pointing the way the current flows, with its unsigned figure. */
export const chevronShapes = (
  current: WantedCurrent,
  { at: [x, y], direction: [dx, dy], figure }: ChevronPlace,
  stale: boolean,
): readonly Primitive[] => {
  const id = `current/${current.name}`;
  const role = stale ? 'soft' : 'read';
  const [half, deep] = [chevron.span / 2, chevron.depth / 2];
  const arm = (side: number): Point => [x - dx * deep - dy * half * side, y - dy * deep + dx * half * side];
  const block = {
    ...figure,
    lines: figure.lines.map((line) => line.map((run) => ({ ...run, role }) as const)),
  };
  return [
    {
      kind: 'path',
      id: `${id}/chevron`,
      of: current.name,
      layer: 'readings',
      thing: 'chevron',
      commands: polyline([arm(1), [x + dx * deep, y + dy * deep], arm(-1)]),
      stroke: role,
      width: chevron.stroke,
    },
    ...blockTexts(block, id, current.name, 'readings', stale),
  ];
};
