import type { ReactElement } from 'react';
import { useStore } from 'zustand';
import type { Desk } from '../desk/desk.ts';

/** Back and forth through the history. Each button's name says what it would do. */
export function StepButtons({ desk }: { readonly desk: Desk }): ReactElement {
  const { past, future } = useStore(desk.store, ({ history }) => history);
  return (
    <div className="steps-buttons" role="group" aria-label="history">
      <StepButton
        verb="undo"
        title={past.at(-1)?.title}
        path="M3 7H10A4 4 0 0 1 10 15H6M6.5 3.5L3 7L6.5 10.5"
        onPress={() => desk.undo()}
      />
      <StepButton
        verb="redo"
        title={future[0]?.title}
        path="M15 7H8A4 4 0 0 0 8 15H12M11.5 3.5L15 7L11.5 10.5"
        onPress={() => desk.redo()}
      />
    </div>
  );
}

interface StepButtonProps {
  readonly verb: string;
  /** Of the step; none where there is nothing to do. */
  readonly title: string | undefined;
  readonly path: string;
  readonly onPress: () => void;
}

function StepButton({ verb, title, path, onPress }: StepButtonProps): ReactElement {
  const name = title === undefined ? verb : `${verb}: ${title}`;
  return (
    <button
      type="button"
      className="plain"
      aria-label={name}
      title={name}
      // Not `disabled`: the focus would fall off a button that has just undone the last step.
      aria-disabled={title === undefined}
      onClick={onPress}
    >
      <svg width="18" height="18" aria-hidden="true">
        <path d={path} />
      </svg>
    </button>
  );
}
