import type { StateReadings } from '../../readings/readings.ts';
import { baseName, effectiveConditions, inState } from '../../stage/states.ts';
import type { EffectiveConditions } from '../../stage/states.ts';
import type { StageDocument } from '../../stage/schema/stage.ts';
import { formatQuantity } from '../../values/format.ts';
import { boundsOfAll } from '../bounds.ts';
import { drawStage, type DrawOptions, type StageDrawing } from '../drawStage.ts';
import { baselineBelowMiddle, wrapped } from '../fontMetrics.ts';
import { closed } from '../paths.ts';
import type { Primitive, Role } from '../primitives.ts';
import { noticeList } from './noticeList.ts';
import { tableShapes } from './table.ts';
import { titleBlockShapes, type TitleBlock } from './titleBlock.ts';
import { transistorTable } from './transistorTable.ts';

export interface PlateOptions extends DrawOptions {
  /** Written where the document has no date of its own. */
  readonly date: string;
  /** Name and version of the program: `Restpoint 0.1.0`. */
  readonly program: string;
  /** Where other conditions than the document's were asked for. */
  readonly conditions?: EffectiveConditions;
}

const padding = 28;
/** Room for the words under the smallest drawing. */
const leastWidth = 820;

/** The drawing with what makes it a record: transistors and verdicts, snags, cautions, assumptions, title block. */
export const drawPlate = (
  document: StageDocument,
  readings: StateReadings | null,
  options: PlateOptions,
): StageDrawing => {
  const drawing = drawStage(document, readings, options);
  const { bounds } = drawing;
  const width = Math.max(leastWidth, bounds.right - bounds.left + 2 * padding);
  const left = Math.round((bounds.left + bounds.right - width) / 2);
  const top = bounds.top - padding;
  const inner = { left: left + 12, width: width - 24 };

  const shapes: Primitive[] = [];
  let y = bounds.bottom + padding;
  const add = (
    part: { readonly shapes: readonly Primitive[]; readonly height: number },
    after: number,
  ): void => {
    shapes.push(...part.shapes);
    y += part.height + after;
  };
  const say = (id: string, text: string, role: Role, weight: 400 | 600 = 400): void => {
    add(paragraph(id, text, role, weight, inner.left, y, inner.width), 10);
  };

  if (readings?.settled === false) say('unsettled', `Not settled: ${readings.reason}`, 'missed', 600);
  if (options.stale === true)
    say('stale', 'Stale: values have changed since these readings were settled.', 'missed', 600);
  const table = readings?.settled === true ? transistorTable(document, readings) : undefined;
  if (table !== undefined) add(tableShapes('plate/transistors', table, inner.left, y, inner.width), 14);
  if (readings !== null) {
    if (readings.snags.length > 0) add(noticeList('snag', readings.snags, inner.left, y, inner.width), 4);
    if (readings.cautions.length > 0)
      add(noticeList('caution', readings.cautions, inner.left, y, inner.width), 4);
  }
  if (drawing.unplaced.length > 0) {
    say('unplaced', `No room on the drawing for: ${drawing.unplaced.join(', ')}.`, 'atRisk');
  }
  if (readings?.settled === true && readings.assumptions.length > 0) {
    say('assumptions', `Assumed: ${readings.assumptions.join('; ')}.`, 'soft');
  }
  const block = titleBlockShapes(titleBlockOf(document, readings, options), left, y, width);
  add(block, 0);

  const border: Primitive = {
    kind: 'path',
    id: 'plate/border',
    layer: 'still',
    thing: 'frame',
    commands: closed([
      [left, top],
      [left + width, top],
      [left + width, y],
      [left, y],
    ]),
    stroke: 'line',
    width: 1,
  };
  const primitives = [border, ...drawing.primitives, ...shapes];
  return { ...drawing, primitives, bounds: boundsOfAll(primitives) };
};

const paragraph = (
  id: string,
  text: string,
  role: Role,
  weight: 400 | 600,
  left: number,
  top: number,
  width: number,
) => {
  const size = 12;
  const lineHeight = 16;
  const lines = wrapped(text, width, size, weight);
  const shapes = lines.map((line, index): Primitive => ({
    kind: 'text',
    id: `plate/${id}${index}`,
    layer: 'still',
    thing: 'title',
    text: line,
    x: left,
    y: top + (index + 0.5) * lineHeight + baselineBelowMiddle(size),
    size,
    weight,
    align: 'left',
    role,
  }));
  return { shapes, height: lines.length * lineHeight };
};

const titleBlockOf = (
  document: StageDocument,
  readings: StateReadings | null,
  options: PlateOptions,
): TitleBlock => {
  const state = options.state ?? baseName(document);
  const conditions =
    options.conditions ?? effectiveConditions((inState(document, state) ?? document).conditions);
  const { ambient, law, selfHeating } = conditions;
  const degrees = (value: number) => formatQuantity(value, '°C');
  const range =
    ambient.low === ambient.high ? [] : [`range ${degrees(ambient.low)} to ${degrees(ambient.high)}`];
  return {
    title: document.title,
    ...(document.notes === undefined ? {} : { notes: document.notes }),
    fields: [
      { label: 'state', lines: [state, settledWords(readings)] },
      {
        label: 'conditions',
        lines: [
          `ambient ${degrees(ambient.nominal)}`,
          ...range,
          `${law} law${selfHeating ? ', self-heating' : ''}`,
        ],
      },
      {
        label: 'date',
        lines: [document.date ?? options.date, ...(document.author === undefined ? [] : [document.author])],
      },
      { label: 'drawn by', lines: [options.program] },
    ],
  };
};

const settledWords = (readings: StateReadings | null): string => {
  if (readings === null) return 'not settled';
  return readings.settled ? 'settled' : 'could not be settled';
};
