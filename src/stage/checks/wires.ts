import type { Fault } from '../../values/result.ts';
import { pinNames } from '../partContext.ts';
import type { StageDocument } from '../schema/stage.ts';
import { faultAt, listed } from './fault.ts';

/** Every end of a wire is a pin of a part or a joint, and no wire joins an end to itself. */
export function checkWires(document: StageDocument): readonly Fault[] {
  const faults: Fault[] = [];
  const pinsOf = new Map(Object.keys(document.parts).map((id) => [id, pinNames(document, id)]));
  const joints = listed(Object.keys(document.joints));
  const parts = listed(Object.keys(document.parts));
  for (const [id, wire] of Object.entries(document.wires)) {
    wire.ends.forEach(([of, pin], index) => {
      const path = ['wires', id, 'ends', index];
      if (pin === undefined) {
        if (Object.hasOwn(document.joints, of)) return;
        faults.push(faultAt([...path, 0], 'no-such-joint', `There is no joint ${of}.`, `"${of}"`, joints));
        return;
      }
      if (!Object.hasOwn(document.parts, of)) {
        faults.push(faultAt([...path, 0], 'no-such-part', `There is no part ${of}.`, `"${of}"`, parts));
        return;
      }
      const pins = pinsOf.get(of);
      // Of a part whose device is wrong that fault is told, not those that may follow from it.
      if (pins === undefined || pins.includes(pin)) return;
      const message = `Part ${of} has no pin "${pin.slice(0, 60)}".`;
      faults.push(faultAt([...path, 1], 'no-such-pin', message, `"${pin.slice(0, 60)}"`, listed(pins)));
    });
    const [[fromPart, fromPin], [toPart, toPin]] = wire.ends;
    if (fromPart === toPart && fromPin === toPin) {
      faults.push(
        faultAt(
          ['wires', id, 'ends'],
          'wire-to-itself',
          `Wire ${id} begins and ends at the same place: take it out, or give it another end.`,
          fromPin === undefined ? fromPart : `${fromPart}.${fromPin}`,
          'two different ends',
        ),
      );
    }
  }
  return faults;
}
