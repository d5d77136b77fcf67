import { settleStage } from '../readings/settleStage.ts';
import type { StageDocument } from '../stage/schema/stage.ts';
import type { Answer } from './answer.ts';
import type { Call } from './call.ts';
import { ExitStatus, statusOf } from './exitStatus.ts';
import { conditionsOf, statesOf } from './options.ts';
import { stageText } from './text/stageText.ts';

/** `settle`: the operating point of each state, as text or as JSON. */
export const settleVerb = (call: Call, document: StageDocument): Answer => {
  const conditions = conditionsOf(call);
  if (!conditions.ok) return { status: ExitStatus.wrong, faults: conditions.faults };
  const states = statesOf(call, document);
  if (!states.ok) return { status: ExitStatus.wrong, faults: states.faults };
  const readings = settleStage(document, {
    ...conditions.value,
    ...(states.value === undefined ? {} : { states: states.value }),
  });
  const output = call.options.has('json') ? `${JSON.stringify(readings, null, 2)}\n` : stageText(readings);
  return { status: statusOf(readings), output };
};
