import { useMemo, useState, type ReactElement } from 'react';
import type { StateReadings } from '../readings/readings.ts';
import { settleStage } from '../readings/settleStage.ts';
import type { StageDocument } from '../stage/schema/stage.ts';
import { baseName, stateNames } from '../stage/states.ts';
import { Choice } from './Choice.tsx';
import { Head } from './Head.tsx';
import { Notices } from './Notices.tsx';
import { Plate } from './Plate.tsx';
import { ReadingsTable } from './ReadingsTable.tsx';
import { Transistors } from './Transistors.tsx';

interface StageViewProps {
  readonly stage: StageDocument;
  /** The list of examples, at the head of the ledger. */
  readonly list: ReactElement;
}

const stepsOf = (readings: StateReadings): string => {
  if (!readings.settled) return 'not settled';
  return `settled in ${readings.iterations} ${readings.iterations === 1 ? 'step' : 'steps'}`;
};

/** One stage, settled and drawn, in the state that is chosen. */
export function StageView({ stage, list }: StageViewProps): ReactElement {
  const [state, setState] = useState(baseName(stage));
  const readings = useMemo(() => settleStage(stage), [stage]).states[state];
  if (readings === undefined) throw new Error(`The stage has no state "${state}".`);

  return (
    <>
      <Head title={stage.title}>
        <span className="rule" />
        <Choice name="state" options={stateNames(stage)} chosen={state} onChoose={setState} filled />
        <p className={readings.settled ? 'steps' : 'steps not'} role="status">
          {stepsOf(readings)}
        </p>
      </Head>
      <aside className="ledger" aria-label="ledger">
        {list}
        {readings.settled && <Transistors state={readings} />}
        <Notices kind="snag" notices={readings.snags} />
        <Notices kind="caution" notices={readings.cautions} />
      </aside>
      <main className="sheet" id="sheet" tabIndex={0} aria-label="sheet">
        <Plate stage={stage} state={state} readings={readings} />
        {readings.settled && <ReadingsTable title={`${stage.title}, ${state}`} state={readings} />}
      </main>
      <div className="ticks" />
    </>
  );
}
