import type { PartContext, PartKind } from '../parts/kind.ts';
import { kindNamed } from '../parts/catalogue.ts';
import type { Part, StageDocument } from './schema/stage.ts';

const nothing: Readonly<Record<string, unknown>> = {};

/** The pins of each part on which a wire ends. */
export function wiredOf(
  document: Pick<StageDocument, 'parts' | 'wires'>,
): ReadonlyMap<string, ReadonlySet<string>> {
  const wired = new Map<string, Set<string>>(Object.keys(document.parts).map((id) => [id, new Set()]));
  for (const { ends } of Object.values(document.wires)) {
    for (const [of, pin] of ends) if (pin !== undefined) wired.get(of)?.add(pin);
  }
  return wired;
}

/** The kind of a part of a document that was read. */
export function kindOf(part: Part): PartKind {
  const kind = kindNamed(part.kind);
  if (kind === undefined) throw new Error(`no kind is named ${part.kind}`);
  return kind;
}

/** What a kind is told of one part: `wired` is left to the caller who has it for all parts at once. */
export function partContext(
  document: Pick<StageDocument, 'parts' | 'devices'>,
  id: string,
  wired: ReadonlySet<string>,
): PartContext {
  const part = document.parts[id];
  if (part === undefined) throw new Error(`no part ${id}`);
  const device = part.device === undefined ? undefined : document.devices[part.device];
  return {
    name: part.name ?? id,
    ...(part.label === undefined ? {} : { label: part.label }),
    values: part.values ?? nothing,
    ...(device === undefined ? {} : { device }),
    wired,
  };
}

/** Whether a part names no device and needs none, or one that there is and that is of a type its kind takes. */
export function deviceFits(
  document: Pick<StageDocument, 'devices'>,
  part: Part,
  device = part.device,
): boolean {
  const { deviceTypes } = kindOf(part);
  if (device === undefined) return deviceTypes.length === 0;
  const found = Object.hasOwn(document.devices, device) ? document.devices[device] : undefined;
  return found !== undefined && deviceTypes.includes(found.type);
}

/**
 * Names of a part's pins, in the order of the stage file's table. They do not depend on what is wired; they may on
 * the device, so that of a part whose device does not fit (while a file is checked) nothing is known.
 */
export function pinNames(
  document: Pick<StageDocument, 'parts' | 'devices'>,
  id: string,
): readonly string[] | undefined {
  const part = document.parts[id];
  if (part === undefined || !deviceFits(document, part)) return undefined;
  return Object.keys(kindOf(part).pins(partContext(document, id, new Set())));
}
