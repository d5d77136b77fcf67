import { useCallback, useEffect, useRef, useState, type KeyboardEvent, type ReactElement } from 'react';
import { useStore } from 'zustand';
import { Choice } from '../controls/Choice.tsx';
import type { Desk } from '../desk/desk.ts';
import type { Theme } from '../drawing/themes.ts';
import { Announcement } from './Announcement.tsx';
import { Gestures } from './gestures.ts';
import { pressKey } from './keys.ts';
import { Painters } from './Painters.tsx';
import { SheetPicture } from './picture.ts';
import './sheet.css';
import { StripPlace } from './strip/StripPlace.tsx';
import { ValueStrip } from './strip/ValueStrip.tsx';
import { useFont } from './useFont.ts';
import { usePointer } from './usePointer.ts';
import { SheetView } from './view.ts';
import { ZoomControls } from './ZoomControls.tsx';

interface SheetProps {
  readonly desk: Desk;
  readonly theme: Theme;
}

const densities = ['all', 'key', 'none'] as const;

/** The canvas on which the stage is drawn, with what floats over it. */
export function Sheet({ desk, theme }: SheetProps): ReactElement {
  const [parts] = useState(() => {
    const picture = new SheetPicture(desk);
    const view = new SheetView();
    return { picture, view, gestures: new Gestures(desk, picture, view) };
  });
  const { picture, view, gestures } = parts;
  const box = useRef<HTMLDivElement>(null);
  const fontThere = useFont();
  const strip = useStore(view.store, (now) => now.strip);
  const density = useStore(desk.store, (now) => now.density);
  const measured = useStore(view.store, ({ size }) => size.width > 0 && size.height > 0);

  useEffect(() => picture.connect(), [picture]);
  usePointer(box, gestures, view);

  useEffect(() => {
    const element = box.current;
    if (element === null) return;
    const observer = new ResizeObserver(() =>
      view.resize({ width: element.clientWidth, height: element.clientHeight }, picture.bounds),
    );
    observer.observe(element);
    return () => observer.disconnect();
  }, [picture, view]);

  const press = (event: KeyboardEvent) => {
    if (event.key === ' ') gestures.holdSpace(true);
    else if (event.key === 'Escape' && gestures.cancel()) return;
    else if (!pressKey(event, { desk, picture, view })) return;
    event.preventDefault();
  };
  const release = (event: KeyboardEvent) => {
    if (event.key === ' ') gestures.holdSpace(false);
  };
  const close = useCallback(() => {
    view.closeStrip();
    box.current?.focus();
  }, [view]);
  // The strip leaves when its part does, or when another thing is chosen.
  useEffect(
    () =>
      desk.store.subscribe(({ selection }) => {
        const open = view.store.getState().strip;
        if (open !== null && !selection.has(open)) view.leaveStrip();
      }),
    [desk, view],
  );

  return (
    <>
      <div
        ref={box}
        className="sheet-box"
        id="sheet"
        role="application"
        aria-label="sheet"
        aria-describedby="sheet-keys"
        tabIndex={0}
        onKeyDown={press}
        onKeyUp={release}
        onBlur={() => gestures.holdSpace(false)}
      >
        {fontThere && measured && <Painters desk={desk} picture={picture} view={view} theme={theme} />}
      </div>
      <p id="sheet-keys" className="unseen">
        Tab walks the parts, arrows move the chosen ones, comma and full stop turn them, slash mirrors them,
        Enter opens the value, Delete removes, Escape leaves.
      </p>
      <Announcement desk={desk} />
      {strip !== null && (
        <StripPlace part={strip} picture={picture} view={view}>
          <ValueStrip desk={desk} view={view} part={strip} onClose={close} />
        </StripPlace>
      )}
      <div className="density">
        <Choice
          name="readings"
          options={densities}
          chosen={density}
          onChoose={(chosen) => desk.setDensity(chosen)}
        />
      </div>
      <ZoomControls picture={picture} view={view} />
    </>
  );
}
