import { useMemo, type ReactElement } from 'react';
import { drawStage } from '../drawing/drawStage.ts';
import { toSvg } from '../drawing/svg.ts';
import { themes } from '../drawing/themes.ts';
import type { StateReadings } from '../readings/readings.ts';
import { layOut } from '../stage/layout/layOut.ts';
import { routeStage } from '../stage/routing/routeWires.ts';
import type { StageDocument } from '../stage/schema/stage.ts';
import { useTheme } from './theme.ts';

/** Enlargement where the sheet has the room; past it a small stage looks coarse. */
const largest = 1.4;

interface PlateProps {
  readonly stage: StageDocument;
  readonly state: string;
  readonly readings: StateReadings;
}

/** The stage as the plate shows it, as large as the sheet allows. */
export function Plate({ stage, state, readings }: PlateProps): ReactElement {
  const theme = useTheme();
  const placed = useMemo(() => {
    const document = layOut(stage);
    return { document, routes: routeStage(document).paths };
  }, [stage]);
  const drawing = useMemo(
    () => drawStage(placed.document, readings, { density: 'all', routes: placed.routes, state }),
    [placed, readings, state],
  );
  const picture = toSvg(drawing, themes[theme], { title: `${stage.title}, ${state}`, scale: largest });
  // The text is our own writer's, which escapes whatever a file says.
  return <div className="plate" data-testid="plate" dangerouslySetInnerHTML={{ __html: picture }} />;
}
