import type { StageDocument } from '../../stage/schema/stage.ts';

/** Joints all of whose wires lead, straight or by other such joints, to the parts given: they move with them. */
export const jointsBetween = (
  document: Pick<StageDocument, 'joints' | 'wires'>,
  parts: ReadonlySet<string>,
): ReadonlySet<string> => {
  const wires = Object.values(document.wires);
  const between = new Set(Object.keys(document.joints));
  // Joints are struck off until those that are left hang on the parts and on each other alone.
  for (let before = -1; before !== between.size;) {
    before = between.size;
    for (const { ends } of wires) {
      const [[one], [other]] = ends;
      const stays = (end: string) => !parts.has(end) && !between.has(end);
      if (stays(one)) between.delete(other);
      if (stays(other)) between.delete(one);
    }
  }
  const hangs = new Set(wires.flatMap(({ ends: [[one], [other]] }) => [one, other]));
  return new Set([...between].filter((joint) => hangs.has(joint)));
};
