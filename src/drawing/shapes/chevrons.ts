import { blockTexts, type TextBlock } from '../lettering/textBlock.ts';
import { polyline } from '../paths.ts';
import { chevron, type ChevronPlace } from '../places/chevronPlaces.ts';
import type { Point } from '../boxes.ts';
import type { Primitive } from '../primitives.ts';
import type { WantedCurrent } from '../wanted/wanted.ts';

/** An open chevron in the lead, pointing the way the current flows, with its unsigned figure. */
export const chevronShapes = (
  current: WantedCurrent,
  place: ChevronPlace,
  stale: boolean,
): readonly Primitive[] => {
  const { id, of } = current;
  const {
    at: [x, y],
    figure,
  } = place;
  const [dx, dy] = pointing(current, place);
  const role = stale ? 'soft' : 'read';
  const [half, deep] = [chevron.span / 2, chevron.depth / 2];
  const arm = (side: number): Point => [x - dx * deep - dy * half * side, y - dy * deep + dx * half * side];
  const block: TextBlock = {
    ...figure,
    lines: [[{ text: current.text, weight: 400, role, thing: 'figure' }]],
  };
  return [
    {
      kind: 'path',
      id: `${id}/chevron`,
      of,
      layer: 'readings',
      thing: 'chevron',
      commands: polyline([arm(1), [x + dx * deep, y + dy * deep], arm(-1)]),
      stroke: role,
      width: chevron.stroke,
    },
    ...blockTexts(block, id, of, 'readings', stale),
  ];
};

/** The way the current flows now, which may have turned since the place was found. */
const pointing = (current: WantedCurrent, { run, along: [x, y] }: ChevronPlace): Point => {
  const found = current.runs.find(({ piece, stretch }) => piece === run.piece && stretch === run.stretch);
  return found?.forward === false ? [-x, -y] : [x, y];
};
