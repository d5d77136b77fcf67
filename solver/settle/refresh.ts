/** Works out anew what depends on values and temperature, where these changed since the last time. */
import type { Element } from '../circuit.ts';
import { at, codeAt, indexAt } from '../elements/at.ts';
import { DECLARED_LEAK } from '../elements/constants.ts';
import { updateHull } from '../structure/hull.ts';
import { UnknownKind, type Prepared } from './prepared.ts';
import type { SettleOptions } from './settlement.ts';

/** Part of the declared leak by element. */
export type LeakScale = (element: number) => number;

export const wholeLeak: LeakScale = () => 1;

/**
 * A hundredth of the leak, but not of every element alike: a divider made of equal leaks would rest where it
 * rested before, and is as little set by the drawing. The shares follow the golden ratio, 0.5 … 1.5 hundredths.
 */
export const hundredthLeak: LeakScale = (element) => 0.01 * (0.5 + ((element * 0.6180339887498949) % 1));

/** Brings `derived` up to date. Returns an element whose values give no number, if there is one. */
export function refresh(prepared: Prepared, options: SettleOptions, leakScale: LeakScale): Element | null {
  const { places, work, seenValues, seenTemperatures, seenLeaks } = prepared;
  let changed = false;
  for (let e = 0; e < places.length; e++) {
    const place = places[e];
    if (!place) continue;
    const { element, value } = place;
    const { values, law } = element;
    const temperature = options.temperatures ? at(options.temperatures, e) : options.temperature;
    const leak = DECLARED_LEAK * leakScale(e);
    let same = temperature === at(seenTemperatures, e) && leak === at(seenLeaks, e);
    for (let k = 0; k < values.length; k++) {
      const present = at(values, k);
      if (Object.is(present, at(seenValues, value + k))) continue; // NaN stands for "not given" in some laws
      same = false;
      seenValues[value + k] = present;
      changed = true;
    }
    if (same) continue;
    seenTemperatures[e] = temperature;
    seenLeaks[e] = leak;
    law.derive(values, { temperature, leak }, work.derived, place.derived);
    for (let k = 0; k < law.derivedSize; k++)
      if (Number.isNaN(at(work.derived, place.derived + k))) {
        seenTemperatures[e] = NaN;
        return element;
      }
  }
  if (changed) updateKinds(prepared);
  return null;
}

/** Works out the hull and from it the kind of every node. */
function updateKinds({ circuit, hull, kinds, places, gather }: Prepared): void {
  updateHull(circuit, hull);
  const kindOf = (node: number): number => {
    if (codeAt(hull.pinned, node) === 1) return UnknownKind.pinned;
    return codeAt(hull.bound, node) === 1 ? UnknownKind.bound : UnknownKind.loose;
  };
  for (let node = 1; node < circuit.nodes.length; node++) kinds[node - 1] = kindOf(node);
  let internal = circuit.nodes.length;
  for (const { element, unknown } of places) {
    const { terminals, internals } = element.law;
    for (let k = 0; k < internals.length; k++)
      kinds[indexAt(gather, unknown + terminals.length + k)] = kindOf(internal++);
  }
}
