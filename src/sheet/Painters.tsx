import type Konva from 'konva';
import { useEffect, useRef, type ReactElement } from 'react';
import { Layer, Shape, Stage as KonvaStage } from 'react-konva/lib/ReactKonvaCore';
import { useStore } from 'zustand';
import type { Desk } from '../desk/desk.ts';
import type { Primitive } from '../drawing/primitives.ts';
import type { Theme } from '../drawing/themes.ts';
import { drawPrimitives } from './canvasPen.ts';
import { frameMark, selectionMarks, tickMarks } from './marks.ts';
import type { SheetPicture } from './picture.ts';
import type { SheetView } from './view.ts';

interface PaintersProps {
  readonly desk: Desk;
  readonly picture: SheetPicture;
  readonly view: SheetView;
  readonly theme: Theme;
}

/**
 * Three canvases, each one shape that paints everything on it; nothing is hit-tested by the canvas. They repaint by
 * subscription, not by rendering: React is here only when the sheet's size or the theme changes.
 */
export function Painters({ desk, picture, view, theme }: PaintersProps): ReactElement {
  const size = useStore(view.store, (now) => now.size);
  const stage = useRef<Konva.Stage>(null);

  useEffect(() => {
    const repaint = () => stage.current?.batchDraw();
    const off = [picture.onChange(repaint), view.store.subscribe(repaint)];
    off.push(
      desk.store.subscribe((now, before) => {
        if (now.selection !== before.selection) repaint();
      }),
    );
    return () => {
      for (const each of off) each();
    };
  }, [desk, picture, view]);

  const painter = (primitives: () => readonly Primitive[]) => (context: Konva.Context) => {
    const { x, y, scale } = view.viewport;
    const canvas = context._context;
    canvas.save();
    canvas.translate(x, y);
    canvas.scale(scale, scale);
    drawPrimitives(canvas, primitives(), theme);
    canvas.restore();
  };
  const under = painter(() => {
    const { strip, frame, viewport } = view.store.getState();
    return [
      ...selectionMarks(picture.prepared, desk.store.getState().selection, strip),
      ...(frame === null ? [] : [frameMark(frame, viewport.scale)]),
    ];
  });
  const ticks = (context: Konva.Context) =>
    drawPrimitives(context._context, [tickMarks(view.viewport, view.store.getState().size)], theme);

  return (
    <KonvaStage ref={stage} width={size.width} height={size.height} listening={false}>
      <Layer listening={false}>
        <Shape sceneFunc={ticks} />
        <Shape sceneFunc={under} />
      </Layer>
      <Layer listening={false}>
        <Shape sceneFunc={painter(() => picture.still)} />
      </Layer>
      <Layer listening={false}>
        <Shape sceneFunc={painter(() => picture.readings)} />
      </Layer>
    </KonvaStage>
  );
}
