import type { ReactElement } from 'react';
import type { Fault } from '../values/result.ts';
import { Head } from './Head.tsx';

interface RefusalProps {
  readonly title: string;
  readonly faults: readonly Fault[];
  readonly list: ReactElement;
}

/** In place of a stage whose file was refused: every fault with its place. */
export function Refusal({ title, faults, list }: RefusalProps): ReactElement {
  return (
    <>
      <Head title={title} />
      <aside className="ledger" aria-label="ledger">
        {list}
      </aside>
      <main className="sheet" id="sheet">
        <section className="refusal">
          <h2>This file was not opened.</h2>
          <ul>
            {faults.map((fault) => (
              <li key={`${fault.path ?? ''} ${fault.code}`}>
                <strong>{fault.path}</strong> {fault.message}
              </li>
            ))}
          </ul>
        </section>
      </main>
    </>
  );
}
