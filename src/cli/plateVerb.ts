import { drawPlate } from '../drawing/plate/plate.ts';
import { toSvg } from '../drawing/svg.ts';
import { themes } from '../drawing/themes.ts';
import { settleStage } from '../readings/settleStage.ts';
import { layOut } from '../stage/layout/layOut.ts';
import { routeWires } from '../stage/routing/index.ts';
import type { StageDocument } from '../stage/schema/stage.ts';
import { baseName, effectiveConditions, inState } from '../stage/states.ts';
import type { Answer } from './answer.ts';
import type { Call } from './call.ts';
import { ExitStatus, statusOf } from './exitStatus.ts';
import { conditionsOf, optionOf, statesOf } from './options.ts';

const choiceOf = <Choice extends string>(
  given: string | undefined,
  choices: readonly Choice[],
  fallback: Choice,
): Choice => choices.find((choice) => choice === given) ?? fallback;

export interface PlateSurroundings {
  /** Written on a plate whose stage has no date of its own. */
  readonly date: string;
  readonly program: string;
}

/** `plate`: the annotated drawing of one state, as SVG or PNG. */
export const plateVerb = async (
  call: Call,
  document: StageDocument,
  { date, program }: PlateSurroundings,
): Promise<Answer> => {
  const conditions = conditionsOf(call);
  if (!conditions.ok) return { status: ExitStatus.wrong, faults: conditions.faults };
  const states = statesOf(call, document);
  if (!states.ok) return { status: ExitStatus.wrong, faults: states.faults };
  const path = optionOf(call, 'out');
  if (path !== undefined && !/\.(svg|png)$/i.test(path)) {
    const message = `--out ends in .svg or .png; found "${path}".`;
    return {
      status: ExitStatus.wrong,
      faults: [{ code: 'option-value', message, found: path, allowed: '.svg, .png' }],
    };
  }

  const state = states.value?.[0] ?? baseName(document);
  const readings = settleStage(document, { ...conditions.value, states: [state] });
  const placed = layOut(document);
  const stated = effectiveConditions((inState(document, state) ?? document).conditions);
  const { ambient, law } = conditions.value;
  const drawing = drawPlate(placed, readings.states[state] ?? null, {
    routes: routeWires(placed),
    state,
    density: choiceOf(
      optionOf(call, 'density'),
      ['all', 'key', 'none'] as const,
      document.view?.density ?? 'all',
    ),
    date,
    program,
    conditions: {
      ...stated,
      ...(ambient === undefined ? {} : { ambient: { nominal: ambient, low: ambient, high: ambient } }),
      ...(law === undefined ? {} : { law }),
    },
  });
  const theme = themes[choiceOf(optionOf(call, 'theme'), ['light', 'dark', 'print'] as const, 'light')];
  const titles = { title: document.title, description: `${document.title}, state ${state}` };
  const status = statusOf(readings);
  if (path === undefined) return { status, output: toSvg(drawing, theme, { ...titles, embedFont: true }) };
  if (/\.svg$/i.test(path)) {
    return { status, file: { path, content: toSvg(drawing, theme, { ...titles, embedFont: true }) } };
  }
  // The rasteriser is loaded for a PNG alone.
  const { toPng } = await import('../drawing/png.ts');
  const scale = ({ '1': 1, '2': 2, '4': 4 } as const)[
    choiceOf(optionOf(call, 'scale'), ['1', '2', '4'] as const, '1')
  ];
  return { status, file: { path, content: toPng(drawing, theme, { ...titles, scale }) } };
};
