import type { ReactElement } from 'react';
import { useStore } from 'zustand';
import type { Desk } from '../desk/desk.ts';
import { mainValueOf } from '../desk/partValue.ts';
import { formatStated } from '../values/value-text.ts';

/** Says what is chosen, for who does not see the outline. */
export function Announcement({ desk }: { readonly desk: Desk }): ReactElement {
  const text = useStore(desk.store, ({ selection, history: { document }, state }) =>
    [...selection]
      .map((id) => {
        const part = document.parts[id];
        const value = mainValueOf(document, state, id);
        const stated = value === undefined ? '' : ` ${formatStated(value.spec, value.quantity)}`;
        return part === undefined ? 'wire' : `${part.name ?? part.kind}${stated}`;
      })
      .join(', '),
  );
  return (
    <p className="unseen" role="status" aria-label="selection">
      {text}
    </p>
  );
}
