import { useEffect, type RefObject } from 'react';
import type { Gestures, Touch } from './gestures.ts';
import type { SheetView } from './view.ts';

/** Zoom of one notch of a common wheel, which reports 100 or 120 pixels. */
const perPixel = 0.0015;

/** Pointers and the wheel on the sheet's box, handed on without rendering. */
export const usePointer = (box: RefObject<HTMLElement | null>, gestures: Gestures, view: SheetView): void => {
  useEffect(() => {
    const element = box.current;
    if (element === null) return;
    const at = (event: MouseEvent): readonly [number, number] => {
      const { left, top } = element.getBoundingClientRect();
      return [event.clientX - left, event.clientY - top];
    };
    const touch = (event: PointerEvent): Touch => ({
      id: event.pointerId,
      at: at(event),
      button: event.button,
      shift: event.shiftKey,
      finger: event.pointerType === 'touch',
    });
    const listeners = new AbortController();
    const on = <Name extends keyof HTMLElementEventMap>(
      name: Name,
      listener: (event: HTMLElementEventMap[Name]) => void,
    ) => element.addEventListener(name, listener, { signal: listeners.signal, passive: false });
    on('pointerdown', (event) => {
      // First of all, so that a field that is left states what was typed in it.
      element.focus({ preventScroll: true });
      element.setPointerCapture(event.pointerId);
      // The middle button would start the browser's own scrolling.
      if (event.button === 1) event.preventDefault();
      gestures.press(touch(event));
    });
    on('pointermove', (event) => gestures.move(touch(event)));
    on('pointerup', (event) => gestures.release(touch(event)));
    on('pointercancel', (event) => gestures.lose(event.pointerId));
    on('wheel', (event) => {
      event.preventDefault();
      // Sideways scrolling comes from two fingers on a pad, and pans; so does a wheel with Shift.
      if (!event.ctrlKey && (event.deltaX !== 0 || event.shiftKey)) {
        view.pan([-event.deltaX, event.shiftKey ? 0 : -event.deltaY]);
        return;
      }
      const pixels = event.deltaMode === 0 ? event.deltaY : event.deltaY * 40;
      view.zoom(Math.exp(-pixels * perPixel * (event.ctrlKey ? 4 : 1)), at(event));
    });
    return () => listeners.abort();
  }, [box, gestures, view]);
};
