/** Works out anew what depends on values and temperature, where these changed since the last time. */
import type { Element } from '../circuit.ts';
import { at } from '../elements/at.ts';
import { DECLARED_LEAK } from '../elements/constants.ts';
import { findHull, updateHull } from '../structure/hull.ts';
import type { Surroundings } from './surroundings.ts';
import { updateKinds, type Prepared } from './prepared.ts';

/** Part of the declared leak by element. */
export type LeakScale = (element: number) => number;

export const wholeLeak: LeakScale = () => 1;

/**
 * A hundredth of the leak, but not of every element alike: a divider made of equal leaks would rest where it
 * rested before, and is as little set by the drawing. The shares follow the golden ratio, 0.5 … 1.5 hundredths.
 */
export const hundredthLeak: LeakScale = (element) => 0.01 * (0.5 + ((element * 0.6180339887498949) % 1));

/** Brings `derived`, hull and kinds up to date. Returns an element whose values give no number, if there is one. */
export function refresh(
  prepared: Prepared,
  { temperature: everywhere, temperatures, leak: wholeOf = DECLARED_LEAK }: Surroundings,
  leakScale: LeakScale,
): Element | null {
  const { places, work, seenValues, seenTemperatures, seenLeaks } = prepared;
  let voltagesChanged = false;
  let pathsChanged = false;
  for (let e = 0; e < places.length; e++) {
    const place = places[e];
    if (!place) continue;
    const { element, value } = place;
    const { values, law } = element;
    const temperature = temperatures ? at(temperatures, e) : everywhere;
    const leak = wholeOf * leakScale(e);
    let same = temperature === at(seenTemperatures, e) && leak === at(seenLeaks, e);
    for (let k = 0; k < values.length; k++) {
      const present = at(values, k);
      if (Object.is(present, at(seenValues, value + k))) continue; // NaN stands for "not given" in some laws
      same = false;
      seenValues[value + k] = present;
      if (law.pathValues?.includes(k)) pathsChanged = true;
      if (place.isSource) voltagesChanged = true;
    }
    if (same) continue;
    work.linearKnown = false;
    seenTemperatures[e] = temperature;
    seenLeaks[e] = leak;
    law.derive(values, { temperature, leak }, work.derived, place.derived);
    for (let k = 0; k < law.derivedSize; k++)
      if (Number.isNaN(at(work.derived, place.derived + k))) {
        seenTemperatures[e] = NaN; // look again next time
        return element;
      }
  }
  if (pathsChanged) {
    prepared.hull = findHull(prepared.circuit);
    updateKinds(prepared);
  } else if (voltagesChanged) updateHull(prepared.hull);
  return null;
}
