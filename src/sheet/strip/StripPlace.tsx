import { useLayoutEffect, useRef, type ReactElement, type ReactNode } from 'react';
import { boundsOf } from '../../drawing/bounds.ts';
import { washBox } from '../marks.ts';
import type { SheetPicture } from '../picture.ts';
import type { SheetView } from '../view.ts';
import { sideOf, stripAt, type Side } from './place.ts';

interface StripPlaceProps {
  readonly part: string;
  readonly picture: SheetPicture;
  readonly view: SheetView;
  readonly children: ReactNode;
}

/** Keeps the strip at its part while the sheet is panned and zoomed, without rendering. */
export function StripPlace({ part, picture, view, children }: StripPlaceProps): ReactElement {
  const place = useRef<HTMLDivElement>(null);
  useLayoutEffect(() => {
    /** Chosen when the strip opens: it must not leap about under the hand. */
    let side: Side | undefined;
    const stand = () => {
      const found = picture.prepared.scene.partOf.get(part);
      const wash = washBox(picture.prepared, part);
      if (place.current === null || found === undefined || wash === undefined) return;
      const { viewport, size } = view.store.getState();
      const around = { wash, lead: found.origin[0], viewport, sheet: size };
      side ??= sideOf(around, [
        ...picture.readings.map(boundsOf),
        ...picture.prepared.scene.parts.map(({ body }) => body),
      ]);
      const { left, top, notch } = stripAt(around, side);
      place.current.style.transform = `translate(${left}px, ${top}px)`;
      place.current.style.setProperty('--notch', `${notch}px`);
      place.current.dataset.side = side.below ? 'below' : 'above';
    };
    stand();
    const off = [picture.onChange(stand), view.store.subscribe(stand)];
    return () => {
      for (const each of off) each();
    };
  }, [part, picture, view]);
  return (
    <div ref={place} className="strip-place">
      {children}
    </div>
  );
}
