import type { Device } from './devices/device.ts';
import type { PartContext } from './kind.ts';

/**
 * The part's device, of one of the types its kind takes.
 * @throws Error where there is none: the document was not checked, a programmer's mistake.
 */
export const deviceOf = <Type extends Device['type']>(
  context: PartContext,
  ...types: readonly Type[]
): Extract<Device, { type: Type }> => {
  const { device } = context;
  if (device === undefined || !types.some((type) => type === device.type)) {
    throw new Error(`${context.name} needs a device of type ${types.join(' or ')}`);
  }
  return device as Extract<Device, { type: Type }>;
};

/** The device's title as the value of the part that names it. */
export const titleLine = ({ device }: PartContext): readonly string[] =>
  device?.title === undefined ? [] : [device.title];
