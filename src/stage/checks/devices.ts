import type { Fault } from '../../values/result.ts';
import { deviceFits, kindOf, partContext, wiredOf } from '../partContext.ts';
import type { StageDocument } from '../schema/stage.ts';
import { faultAt, listed } from './fault.ts';

/** Every device that is named exists and is of a type the part takes; what a kind itself asks of both holds. */
export function checkDevices(document: StageDocument): readonly Fault[] {
  const faults: Fault[] = [];
  const check = (path: readonly (string | number)[], part: string, device: string): boolean => {
    const found = Object.hasOwn(document.devices, device) ? document.devices[device] : undefined;
    if (found === undefined) {
      const message = `There is no device ${device}.`;
      faults.push(
        faultAt(path, 'no-such-device', message, `"${device}"`, listed(Object.keys(document.devices))),
      );
      return false;
    }
    const of = document.parts[part];
    if (of === undefined) return false;
    const { deviceTypes } = kindOf(of);
    if (deviceFits(document, of, device)) return true;
    const message = `Device ${device} is a ${found.type}, and part ${part} is a ${of.kind}: choose another device.`;
    faults.push(faultAt(path, 'device-does-not-fit', message, found.type, listed(deviceTypes, 'no device')));
    return false;
  };

  const wired = wiredOf(document);
  for (const [id, part] of Object.entries(document.parts)) {
    if (part.device !== undefined && !check(['parts', id, 'device'], id, part.device)) continue;
    for (const fault of kindOf(part).check(partContext(document, id, wired.get(id) ?? new Set()))) {
      faults.push({ ...fault, path: fault.path === undefined ? `parts.${id}` : `parts.${id}.${fault.path}` });
    }
    if (part.mismatch !== undefined && part.lot === undefined) {
      const message = `Part ${id} states a mismatch without a lot: name the lot it is drawn from.`;
      faults.push(
        faultAt(
          ['parts', id, 'mismatch'],
          'mismatch-without-lot',
          message,
          String(part.mismatch),
          'a mismatch beside a lot',
        ),
      );
    }
  }
  for (const [id, devices] of Object.entries(document.alternates ?? {})) {
    if (!Object.hasOwn(document.parts, id)) {
      const message = `There is no part ${id}.`;
      faults.push(
        faultAt(['alternates', id], 'no-such-part', message, `"${id}"`, listed(Object.keys(document.parts))),
      );
      continue;
    }
    devices.forEach((device, index) => {
      check(['alternates', id, index], id, device);
    });
  }
  return faults;
}
