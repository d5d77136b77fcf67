/** Opens an example as a person would hand it over, and settles every state of it. */
import { readFileSync } from 'node:fs';
import { expect } from 'vitest';
import { readStage } from '../../src/stage/readStage.ts';
import { settleStage } from '../../src/readings/settleStage.ts';
import type {
  BipolarReading,
  MosfetReading,
  SettledState,
  TwoPinReading,
} from '../../src/readings/readings.ts';

const folder = new URL('../../examples/', import.meta.url);

export const exampleText = (name: string): string =>
  readFileSync(new URL(`${name}.stage.json`, folder), 'utf8');

export interface SettledExample {
  readonly state: (name: string) => SettledState;
  readonly mosfet: (state: string, name: string) => MosfetReading;
  readonly twoPin: (state: string, name: string) => TwoPinReading;
  readonly volts: (state: string, pin: string) => number;
}

export async function settledExample(name: string): Promise<SettledExample> {
  const read = await readStage(exampleText(name));
  if (!read.ok)
    throw new Error(read.faults.map((fault) => `${fault.path ?? ''}: ${fault.message}`).join('\n'));
  const readings = settleStage(read.value);
  const state = (stateName: string): SettledState => {
    const found = readings.states[stateName];
    if (found === undefined)
      throw new Error(`no state ${stateName} among ${Object.keys(readings.states).join(', ')}`);
    if (!found.settled) throw new Error(`${stateName}: ${found.reason}`);
    return found;
  };
  const part = (stateName: string, partName: string) => {
    const reading = state(stateName).parts[partName];
    if (reading === undefined) throw new Error(`no reading of ${partName}`);
    return reading;
  };
  return {
    state,
    mosfet: (stateName, partName) => part(stateName, partName) as MosfetReading,
    twoPin: (stateName, partName) => part(stateName, partName) as TwoPinReading,
    volts: (stateName, pin) => {
      const figure = state(stateName).pins[pin];
      expect(figure, `${pin} in ${stateName}`).toBeTypeOf('number');
      return figure ?? Number.NaN;
    },
  };
}

export type { BipolarReading, MosfetReading };
