import type { Part, StageDocument } from '../stage/schema/stage.ts';

/**
 * Whether two documents, one made from the other by edits, are one and the same circuit: then readings of the one hold
 * of the other. Edits share what they leave alone, so that the same thing is the same object.
 */
export const sameCircuit = (one: StageDocument, other: StageDocument): boolean =>
  one.devices === other.devices &&
  one.conditions === other.conditions &&
  one.base === other.base &&
  one.states === other.states &&
  sameRecord(one.joints, other.joints, () => true) &&
  sameRecord(one.wires, other.wires, (a, b) => a.ends === b.ends) &&
  sameRecord(one.parts, other.parts, samePart);

const sameRecord = <Item>(
  one: Readonly<Record<string, Item>>,
  other: Readonly<Record<string, Item>>,
  same: (a: Item, b: Item) => boolean,
): boolean => {
  if (one === other) return true;
  const keys = Object.keys(one);
  return (
    keys.length === Object.keys(other).length &&
    keys.every((key) => {
      const [a, b] = [one[key], other[key]];
      return a !== undefined && b !== undefined && (a === b || same(a, b));
    })
  );
};

/** Where and how a part stands says nothing of the circuit; everything else does. */
const samePart = (one: Part, other: Part): boolean => {
  const drawn = new Set(['place', 'turn', 'mirror']);
  const keys = new Set([...Object.keys(one), ...Object.keys(other)] as (keyof Part)[]);
  return [...keys].every((key) => drawn.has(key) || one[key] === other[key]);
};
