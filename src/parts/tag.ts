import { symbols } from '../../symbols/index.ts';
import { definePart } from './definePart.ts';
import { textOf } from './values.ts';

/** Joins its node with that of every tag of the same label, and of the rail of that name. */
export const tag = definePart({
  kind: 'tag',
  title: 'Tag',
  family: 'wiring',
  variants: [{ key: 'tag', title: 'Tag', values: { label: 'OUT' } }],
  nameNeeded: false,
  nameShared: true,
  joins: 'label',
  fields: [{ form: 'text', key: 'label', label: 'label', optional: false }],
  // As a rail, no item of equipment.
  designator: () => 'TAG',
  symbol: () => symbols.tag,
  text: ({ values }) => [textOf(values, 'label') ?? ''],
  principal: null,
  elements: () => [],
  readout: ({ volts }) => ({ shape: 'other', figures: { voltage: volts('node') }, pinCurrents: {} }),
});
