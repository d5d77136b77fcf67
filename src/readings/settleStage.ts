import type { StageDocument } from '../stage/schema/stage.ts';
import { stateNames } from '../stage/states.ts';
import type { StageReadings, StateReadings } from './readings.ts';
import { SettleSession } from './session.ts';
import type { SettleConditions } from './session.ts';

export interface SettleStageOptions extends SettleConditions {
  /** Names of the states to settle; all where left out. Names that are none are passed over. */
  readonly states?: readonly string[];
  readonly signal?: AbortSignal;
}

/** Settles a document in its states: the readings of `settle --json`. */
export const settleStage = (document: StageDocument, options: SettleStageOptions = {}): StageReadings => {
  const { states = stateNames(document), signal, ...conditions } = options;
  const readings: Record<string, StateReadings> = {};
  for (const state of states) {
    const session = SettleSession.open(document, state, conditions);
    if (session !== undefined) readings[state] = session.settle(signal === undefined ? {} : { signal });
  }
  return { format: 'restpoint-readings', version: 1, title: document.title, states: readings };
};
