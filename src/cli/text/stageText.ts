import type { StageReadings, StateReadings } from '../../readings/readings.ts';
import { figure } from './figures.ts';
import { noticeLines } from './notices.ts';
import { otherLines } from './others.ts';
import { table } from './table.ts';
import { transistorLines } from './transistors.ts';
import { wrapped } from './wrap.ts';

/** Every pin of a part that has readings, with its voltage and the current into the part; a ground says nothing new. */
const pinLines = (state: Extract<StateReadings, { settled: true }>): readonly string[] =>
  table(
    [
      { title: 'pin', align: 'left' },
      { title: 'voltage', align: 'right' },
      { title: 'current in', align: 'right' },
    ],
    Object.entries(state.pins)
      .filter(([pin]) => state.parts[pin.slice(0, pin.indexOf('.'))] !== undefined)
      .map(([pin, volts]) => [pin, figure(volts, 'V'), figure(state.pinCurrents[pin], 'A')]),
  );

const block = (lines: readonly string[]): readonly string[] => (lines.length === 0 ? [] : ['', ...lines]);

const stateLines = (name: string, state: StateReadings): readonly string[] => {
  const heading = `state ${name}`;
  const notices = [
    ...block(noticeLines('snags', state.snags)),
    ...block(noticeLines('cautions', state.cautions)),
  ];
  if (!state.settled) {
    return [
      `${heading}: not settled`,
      ...wrapped(state.reason, 76).map((line) => `  ${line}`),
      ...(state.concerns.length === 0
        ? []
        : wrapped(`concerns ${state.concerns.join(', ')}`, 76).map((line) => `  ${line}`)),
      ...notices,
    ];
  }
  const steps = `${state.iterations} ${state.iterations === 1 ? 'step' : 'steps'}`;
  return [
    `${heading}: settled in ${steps}, ${state.method}`,
    ...block(transistorLines(state.parts)),
    ...block(otherLines(state.parts)),
    ...block(pinLines(state)),
    ...notices,
    ...block(
      state.assumptions.length === 0
        ? []
        : ['assumed', ...state.assumptions.flatMap((text) => wrapped(text, 76).map((line) => `  ${line}`))],
    ),
  ];
};

/** What `settle` prints for people: a heading a state, then transistors, other parts, pins, snags, cautions, assumptions. */
export const stageText = (readings: StageReadings): string =>
  [
    readings.title,
    ...Object.entries(readings.states).flatMap(([name, state]) => ['', ...stateLines(name, state)]),
    '',
  ].join('\n');
