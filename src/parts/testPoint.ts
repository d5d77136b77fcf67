import { symbols } from '../../symbols/index.ts';
import { definePart } from './definePart.ts';

/** A place for a meter: draws nothing. */
export const testPoint = definePart({
  kind: 'test-point',
  title: 'Test point',
  family: 'test points',
  variants: [{ key: 'test-point', title: 'Test point', values: {} }],
  fields: [],
  designator: () => 'TP',
  symbol: () => symbols['test-point'],
  text: () => [],
  principal: null,
  elements: () => [],
  readout: ({ volts }) => ({
    shape: 'other',
    figures: { voltage: volts('node') },
    pinCurrents: { node: 0 },
  }),
});
