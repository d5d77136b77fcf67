import type { ReactElement } from 'react';
import { useStore } from 'zustand';
import type { SheetPicture } from './picture.ts';
import type { SheetView } from './view.ts';

const step = 1.25;

/** At the lower right corner: smaller, 100 %, larger, and all in sight. */
export function ZoomControls({
  picture,
  view,
}: {
  readonly picture: SheetPicture;
  readonly view: SheetView;
}): ReactElement {
  const percent = useStore(view.store, ({ viewport }) => Math.round(viewport.scale * 100));
  return (
    <div className="zoom">
      <div className="button-row" role="group" aria-label="zoom">
        <button type="button" aria-label="zoom out" onClick={() => view.zoom(1 / step)}>
          −
        </button>
        <button
          type="button"
          className="percent"
          aria-label={`${percent} %, back to 100 %`}
          onClick={() => view.zoomTo(1)}
        >
          {percent} %
        </button>
        <button type="button" aria-label="zoom in" onClick={() => view.zoom(step)}>
          +
        </button>
      </div>
      <button type="button" onClick={() => view.fit(picture.bounds)}>
        fit
      </button>
    </div>
  );
}
