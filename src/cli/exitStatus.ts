import type { PartReading, StageReadings, StateReadings } from '../readings/readings.ts';

/** What the command line ends with; the highest-ranking that applies to any state computed. */
export const ExitStatus = { fine: 0, duty: 1, wrong: 2, unsettled: 3 } as const;
export type ExitStatus = (typeof ExitStatus)[keyof typeof ExitStatus];

const dutyLost = (part: PartReading): boolean =>
  'verdict' in part && (part.verdict === 'missed' || part.verdict === 'at-risk');

const troubled = (state: StateReadings): boolean =>
  [...state.snags, ...state.cautions].some(
    (notice) => notice.severity === 'stop' || notice.code === 'rating-passed',
  ) ||
  (state.settled && Object.values(state.parts).some(dutyLost));

/** 3 where a state could not be settled; 1 for a duty lost or at risk, a rating passed, or a `stop`; else 0. */
export const statusOf = (readings: StageReadings): ExitStatus => {
  const states = Object.values(readings.states);
  if (states.some((state) => !state.settled)) return ExitStatus.unsettled;
  return states.some(troubled) ? ExitStatus.duty : ExitStatus.fine;
};
