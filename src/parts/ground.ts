import { symbols } from '../../symbols/index.ts';
import { definePart } from './definePart.ts';

/** The reference, 0 V. */
export const ground = definePart({
  kind: 'ground',
  title: 'Ground',
  family: 'wiring',
  variants: [{ key: 'ground', title: 'Ground', values: {} }],
  nameNeeded: false,
  joins: 'reference',
  fields: [],
  // As a rail, no item of equipment.
  designator: () => 'GND',
  symbol: () => symbols.ground,
  text: () => [],
  principal: null,
  elements: () => [],
  readout: () => ({ shape: 'other', figures: {}, pinCurrents: {} }),
});
