import type { Box, SymbolArt, SymbolShape } from './art.ts';
import { arrowhead, line, polygon, reach } from './pen.ts';

/** What a field-effect transistor's symbol is put together from: its files choose. */
const gateAndChannel: readonly SymbolShape[] = [
  line([-reach, 0], [-25, 0]),
  line([-25, -12], [-25, 12]),
  line([-18, -16], [-18, 16]),
];

const upperLead = line([-18, -12], [0, -12], [0, -reach]);
const lowerLead = line([-18, 12], [0, 12], [0, reach]);

const outwardArrow = arrowhead([-4, 12], [1, 0]);
const inwardArrow = arrowhead([-16, -12], [-1, 0]);

/** Conducts upward for both channels: source to drain for n, drain to source for p. */
const bodyDiode: readonly SymbolShape[] = [
  line([0, -23], [17, -23], [17, 23], [0, 23]),
  polygon('paper', [11, 5.5], [23, 5.5], [17, -5.5]),
  line([11, -5.5], [23, -5.5]),
];

const bodyLead = line([-18, 0], [reach, 0]);

const nPins = { gate: [-3, 0], drain: [0, -3], source: [0, 3], body: [3, 0] } as const;
const pPins = { gate: [-3, 0], drain: [0, 3], source: [0, -3], body: [3, 0] } as const;

const outline = (right: number, half: number): Box => ({ left: -25, top: -half, right, bottom: half });

export type MosfetForm = 'discrete' | 'plain' | 'body';

/** `discrete` shows the body diode, `plain` ties the body to the source unseen, `body` brings its lead out. */
export const mosfetArt = (channel: 'n' | 'p', form: MosfetForm): SymbolArt => ({
  pins: channel === 'n' ? nPins : pPins,
  shapes: [
    ...gateAndChannel,
    upperLead,
    lowerLead,
    channel === 'n' ? outwardArrow : inwardArrow,
    ...(form === 'discrete' ? bodyDiode : []),
    ...(form === 'body' ? [bodyLead] : []),
  ],
  body: form === 'discrete' ? outline(23, 23) : outline(0, 16),
});
