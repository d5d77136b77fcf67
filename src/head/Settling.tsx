import type { ReactElement } from 'react';
import { useStore } from 'zustand';
import type { Desk, DeskState } from '../desk/desk.ts';

const words = ({ readings, stale }: DeskState): string => {
  if (readings === null) return 'not yet settled';
  if (stale) return 'changed since it was settled';
  if (!readings.settled) return 'not settled';
  return `settled in ${readings.iterations} ${readings.iterations === 1 ? 'step' : 'steps'}`;
};

/** Settle, keep it so, and how it went. */
export function Settling({ desk }: { readonly desk: Desk }): ReactElement {
  const keep = useStore(desk.store, (now) => now.keepSettled);
  const text = useStore(desk.store, words);
  const failed = useStore(desk.store, ({ readings, stale }) => !stale && readings?.settled === false);
  return (
    <>
      <button type="button" onClick={() => desk.settle()}>
        Settle
      </button>
      <label className="switch">
        <input
          type="checkbox"
          role="switch"
          name="keep"
          checked={keep}
          onChange={(event) => desk.setKeepSettled(event.target.checked)}
        />
        <span className="track" />
        Keep settled
      </label>
      <p className={failed ? 'steps not' : 'steps'} role="status" aria-label="settling">
        {text}
      </p>
    </>
  );
}
