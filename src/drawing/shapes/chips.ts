import { baselineBelowMiddle } from '../fontMetrics.ts';
import { middle } from '../boxes.ts';
import { polyline, roundedBox } from '../paths.ts';
import type { ChipPlace } from '../places/chipPlaces.ts';
import type { Primitive } from '../primitives.ts';
import type { WantedChip } from '../wanted/wanted.ts';

const stroke = 1.25;

/** The outlined chip of a node's voltage and its leader. A node without a value has a dashed chip and words. */
export const chipShapes = (
  chip: WantedChip,
  { chip: box, anchor, end }: ChipPlace,
  stale: boolean,
): readonly Primitive[] => {
  const { id } = chip;
  const role = stale ? 'soft' : 'read';
  const belonging = { of: chip.node.pins[0]?.part.id ?? '', layer: 'readings' } as const;
  const [x, y] = middle(box);
  return [
    {
      ...belonging,
      kind: 'path',
      id: `${id}/leader`,
      thing: 'leader',
      commands: polyline([anchor, end]),
      stroke: role,
      width: stroke,
    },
    {
      ...belonging,
      kind: 'path',
      id: `${id}/box`,
      thing: 'chip',
      commands: roundedBox(box, 3),
      stroke: role,
      fill: 'paper',
      width: stroke,
      ...(chip.volts === null ? { dash: [3.2, 2.8] } : {}),
    },
    {
      ...belonging,
      kind: 'text',
      id: `${id}/text`,
      thing: 'figure',
      text: chip.text,
      x,
      y: y + baselineBelowMiddle(13),
      size: 13,
      weight: 400,
      align: 'centre',
      role,
      ...(stale ? { struck: true } : {}),
    },
  ];
};
