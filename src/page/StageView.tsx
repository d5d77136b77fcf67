import { useEffect, useRef, useState, type ReactElement } from 'react';
import { useStore } from 'zustand';
import { Choice } from '../controls/Choice.tsx';
import { Desk } from '../desk/desk.ts';
import { themes } from '../drawing/themes.ts';
import { Settling } from '../head/Settling.tsx';
import { StepButtons } from '../head/StepButtons.tsx';
import { Sheet } from '../sheet/Sheet.tsx';
import type { StageDocument } from '../stage/schema/stage.ts';
import { stateNames } from '../stage/states.ts';
import { Head } from './Head.tsx';
import { Notices } from './Notices.tsx';
import { ReadingsTable } from './ReadingsTable.tsx';
import { useTheme } from './theme.ts';
import { Transistors } from './Transistors.tsx';

interface StageViewProps {
  readonly stage: StageDocument;
  /** The list of examples, at the head of the ledger. */
  readonly list: ReactElement;
}

/** One stage at work: head, ledger and sheet about one desk. */
export function StageView({ stage, list }: StageViewProps): ReactElement {
  const [desk] = useState(() => new Desk(stage));
  const theme = useTheme();
  const document = useStore(desk.store, ({ history }) => history.document);
  const state = useStore(desk.store, (now) => now.state);
  return (
    <>
      <Head title={document.title}>
        <StepButtons desk={desk} />
        <span className="rule" />
        <Choice
          name="state"
          options={stateNames(document)}
          chosen={state}
          onChoose={(chosen) => desk.chooseState(chosen)}
          filled
        />
        <span className="rule" />
        <Settling desk={desk} />
      </Head>
      <Ledger desk={desk} list={list} />
      <main className="sheet">
        <Sheet desk={desk} theme={themes[theme]} />
        <SpokenReadings desk={desk} />
      </main>
    </>
  );
}

/** Its figures are struck while they are not those of the drawing: after a change, and while a value is dragged. */
function Ledger({ desk, list }: { readonly desk: Desk; readonly list: ReactElement }): ReactElement {
  const readings = useStore(desk.store, (now) => now.readings);
  const stale = useStore(desk.store, (now) => now.stale);
  const ledger = useRef<HTMLElement>(null);
  useEffect(
    () => desk.onLive((frame) => ledger.current?.classList.toggle('dragged', frame !== null)),
    [desk],
  );
  return (
    <aside ref={ledger} className="ledger" data-stale={stale} aria-label="ledger">
      {list}
      {readings?.settled === true && <Transistors state={readings} />}
      <Notices kind="snag" notices={readings?.snags ?? []} />
      <Notices kind="caution" notices={readings?.cautions ?? []} />
    </aside>
  );
}

function SpokenReadings({ desk }: { readonly desk: Desk }): ReactElement | null {
  const { readings, stale, state, history } = useStore(desk.store);
  if (readings?.settled !== true || stale) return null;
  return <ReadingsTable title={`${history.document.title}, ${state}`} state={readings} />;
}
