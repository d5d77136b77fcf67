import type { PartContext, PartKind } from '../parts/kind.ts';
import { kindNamed } from '../parts/catalogue.ts';
import type { Part, StageDocument } from './schema/stage.ts';

const nothing: Readonly<Record<string, unknown>> = {};

/** The pins of a part on which a wire ends. */
export function wiredPins(document: StageDocument, part: string): ReadonlySet<string> {
  const pins = new Set<string>();
  for (const { ends } of Object.values(document.wires)) {
    for (const [of, pin] of ends) if (of === part && pin !== undefined) pins.add(pin);
  }
  return pins;
}

/** The kind of a part of a document that was read. */
export function kindOf(part: Part): PartKind {
  const kind = kindNamed(part.kind);
  if (kind === undefined) throw new Error(`no kind is named ${part.kind}`);
  return kind;
}

/** What a kind is told of one part: `wired` is left to the caller who has it for all parts at once. */
export function partContext(
  document: Pick<StageDocument, 'parts' | 'devices' | 'wires'>,
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

/** Names of a part's pins, in the order of the stage file's table. They do not depend on what is wired. */
export const pinNames = (
  document: Pick<StageDocument, 'parts' | 'devices' | 'wires'>,
  id: string,
): readonly string[] => {
  const part = document.parts[id];
  return part === undefined ? [] : Object.keys(kindOf(part).pins(partContext(document, id, new Set())));
};
